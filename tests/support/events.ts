import { QueryTypes } from 'sequelize'
import { database } from '../../server/database/connection.ts'

export type Recorded = { type: string; subjectId: string; personId: string | null; requestId: string; data: Record<string, unknown> }

/** What the ledger holds about one thing, oldest first. */
export function eventsOf(subjectId: string): Promise<Recorded[]> {
  return database.query<Recorded>(
    'select type, subject_id as "subjectId", person_id as "personId", request_id as "requestId", data from events where subject_id = $1 order by id',
    { bind: [subjectId], type: QueryTypes.SELECT },
  )
}
