import { QueryTypes } from 'sequelize'
import type { Change } from '../../../shared/api/changes.ts'
import type { SubjectName } from '../../../shared/api/permission.ts'
import { database } from '../../database/connection.ts'

export type Told = { id: number; type: string; subject: SubjectName; subjectId: string; customerId: string | null; siteId: string | null; touches: Change[] }

/** What the ledger says after a number, in order. */
export async function readLedgerAfter(id: number, limit: number): Promise<Told[]> {
  return database.query<Told>(
    'select id, type, subject, subject_id as "subjectId", customer_id as "customerId", site_id as "siteId", touches from events where id > $1 order by id limit $2',
    { bind: [id, limit], type: QueryTypes.SELECT },
  )
}

/** The newest number of the ledger, 0 when nothing has happened yet. */
export async function lastLedgerId(): Promise<number> {
  const [head] = await database.query<{ id: number }>(`select event_id as id from chain_heads where chain = 'all'`, { type: QueryTypes.SELECT })
  return head?.id ?? 0
}
