import { literal, Op, type Order as SqlOrder, type WhereOptions } from 'sequelize'
import type * as z from 'zod'
import type { listJobs as endpoint } from '../../../shared/api/jobs.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { database } from '../../database/connection.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Job } from '../../models/jobs/job.ts'
import { jobRows } from './view/job-rows.ts'

/** The day a job has to be done by: what the client asked for, else what was promised; without either it comes last. */
const due = `coalesce("Job"."needed_by", ("Job"."promised_at" at time zone 'UTC')::date, date '9999-12-31')`
const dueKey = /^(\d{4}-\d{2}-\d{2}) ([0-9a-f-]{36})$/

/** Jobs that the caller may see, newest first or the most urgent first. */
export async function listJobs({ state, search, sort, after, limit }: z.infer<typeof endpoint.query>, caller: Caller) {
  const allowed = accessibleWhere(caller.ability, 'read', 'Job')
  if (!allowed) return { items: [], next: null }
  const where: WhereOptions[] = [allowed, ...(state ? [{ state }] : []), ...(search ? [found(search)] : []), ...(after ? [later(sort, after)] : [])]
  const order: SqlOrder = sort === 'newest' ? [['id', 'DESC']] : [[literal(due), 'ASC'], ['id', 'ASC']]
  const jobs = await Job.findAll({ where: { [Op.and]: where }, order, limit: limit + 1, raw: true })
  const shown = jobs.slice(0, limit)
  const last = shown.at(-1)
  return { items: await jobRows(shown, caller), next: jobs.length > limit && last ? keyOf(sort, last) : null }
}

/** Jobs by number, purchase order or content, and those with a sample of this heat or lot. */
function found(search: string): WhereOptions {
  const like = `%${search.replace(/[\\%_]/g, '\\$&')}%`
  const begins = database.escape(like.slice(1))
  return { [Op.or]: [
    { number: { [Op.iLike]: like } }, { purchaseOrder: { [Op.iLike]: like } }, { what: { [Op.iLike]: like } },
    literal(`exists (select 1 from samples s where s.job_id = "Job"."id" and (s.heat ilike ${begins} or s.lot ilike ${begins}))`),
  ] }
}

function keyOf(sort: 'newest' | 'due', { id, neededBy, promisedAt }: Job): string {
  return sort === 'newest' ? id : `${neededBy ?? promisedAt?.toISOString().slice(0, 10) ?? '9999-12-31'} ${id}`
}

function later(sort: 'newest' | 'due', after: string): WhereOptions {
  const [, day, id] = dueKey.exec(sort === 'newest' ? `9999-12-31 ${after}` : after) ?? []
  if (!day || !id) throw new Problem('not-acceptable', 'this is not where a part of this list begins', { after: 'take it from the answer before' })
  return sort === 'newest' ? { id: { [Op.lt]: id } } : literal(`(${due}, "Job"."id") > (date ${database.escape(day)}, ${database.escape(id)}::uuid)`)
}
