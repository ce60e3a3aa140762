import type { Transaction } from 'sequelize'
import { database } from '../../../database/connection.ts'

/** Deletes every session of a person, whichever browser it is on. */
export async function endSessions(personId: string, tx: Transaction): Promise<void> {
  await database.query(`delete from sessions where sess -> 'passport' ->> 'user' = $1`, { bind: [personId], transaction: tx })
}
