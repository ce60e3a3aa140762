import { QueryTypes } from 'sequelize'
import type { Change } from '../../../shared/api/changes.ts'
import type { SubjectName } from '../../../shared/api/permission.ts'
import { database } from '../../database/connection.ts'

export type Told = { id: number; type: string; subject: SubjectName; subjectId: string; customerId: string | null; siteId: string | null; jobState: string | null; touches: Change[] }

/** What the ledger says after a number, in order. A job that is gone was a draft. */
export async function readLedgerAfter(id: number, limit: number): Promise<Told[]> {
  return database.query<Told>(
    `select e.id, e.type, e.subject, e.subject_id as "subjectId", e.customer_id as "customerId", e.site_id as "siteId", case when e.job_id is not null then coalesce(j.state, 'draft') end as "jobState", e.touches
     from events e left join jobs j on j.id = e.job_id where e.id > $1 order by e.id limit $2`,
    { bind: [id, limit], type: QueryTypes.SELECT },
  )
}

/** The newest number of the ledger, 0 when nothing has happened yet. */
export async function lastLedgerId(): Promise<number> {
  const [head] = await database.query<{ id: number }>(`select event_id as id from chain_heads where chain = 'all'`, { type: QueryTypes.SELECT })
  return head?.id ?? 0
}
