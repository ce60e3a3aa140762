import { fn } from 'sequelize'
import * as z from 'zod'
import { jobStates, type JobState } from '../../../shared/api/words.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Job } from '../../models/jobs/job.ts'

const Rows = z.array(z.object({ state: z.enum(jobStates), count: z.coerce.number() }))

/** How many of the jobs that the caller may see are in each state. */
export async function countJobs(caller: Caller): Promise<{ counts: Record<JobState, number> }> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Job')
  const rows = allowed ? Rows.parse(await Job.findAll({ where: allowed, attributes: ['state', [fn('count', '*'), 'count']], group: ['state'], raw: true })) : []
  const counts = { draft: 0, placed: 0, 'awaiting samples': 0, 'in work': 0, 'in review': 0, reported: 0, closed: 0, cancelled: 0 }
  for (const { state, count } of rows) counts[state] = count
  return { counts }
}
