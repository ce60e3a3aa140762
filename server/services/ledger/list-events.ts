import { QueryTypes } from 'sequelize'
import { Problem } from '../../../shared/problems.ts'
import { database } from '../../database/connection.ts'
import type { Caller } from '../../caller.ts'
import { loadOne } from '../../models/load.ts'
import { Job } from '../../models/jobs/job.ts'

type Row = { id: number; type: string; at: Date; by: string | null; data: { text?: unknown } }

/** What has happened to a job, newest first, for the lab that works on it. */
export async function listEvents(jobId: string, { after, limit }: { after?: string; limit: number }, caller: Caller) {
  await loadOne(Job, 'Job', jobId, caller)
  if (after !== undefined && !/^\d{1,15}$/.test(after)) throw new Problem('not-acceptable', 'this is not where a part of this list begins', { after: 'take it from the answer before' })
  const rows = await database.query<Row>(
    `select e.id, e.type, e.at, p.name as by, e.data from events e left join people p on p.id = e.person_id
     where e.job_id = $1 and e.id < $2 order by e.id desc limit $3`,
    { bind: [jobId, after ?? Number.MAX_SAFE_INTEGER, limit + 1], type: QueryTypes.SELECT },
  )
  const items = rows.slice(0, limit).map(({ id, type, at, by, data }) => ({ id: String(id), type, at: at.toISOString(), by, text: typeof data.text === 'string' ? data.text : '' }))
  return { items, next: rows.length > limit ? items.at(-1)!.id : null }
}
