import { Op, type WhereOptions } from 'sequelize'
import type { SampleRow } from '../../../shared/api/samples.ts'
import type { SampleState } from '../../../shared/api/words.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Customer } from '../../models/people/customer.ts'
import { Site } from '../../models/sites/site.ts'
import { viewsOfSamples } from './views-of-samples.ts'

type Filter = { after?: string; limit: number; search?: string; state?: SampleState; jobId?: string }

/** Samples the caller may see, newest first; the search looks at the start of heat, lot, number and code. */
export async function listSamples({ after, limit, search, state, jobId }: Filter, caller: Caller): Promise<{ items: SampleRow[]; next: string | null }> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Sample')
  if (!allowed) return { items: [], next: null }
  const where: WhereOptions[] = [allowed]
  if (after) where.push({ id: { [Op.lt]: after } })
  if (state) where.push({ state })
  if (jobId) where.push({ jobId })
  if (search) {
    const like = `${search.replace(/[\\%_]/g, '\\$&')}%`
    const inCapitals = { [Op.like]: like.toUpperCase() }
    where.push({ [Op.or]: [{ heat: { [Op.iLike]: like } }, { lot: { [Op.iLike]: like } }, { number: inCapitals }, { code: inCapitals }] })
  }
  const samples = await Sample.findAll({ where: { [Op.and]: where }, order: [['id', 'DESC']], limit: limit + 1, raw: true })
  const shown = samples.slice(0, limit)
  const [views, jobs, sites] = await Promise.all([
    viewsOfSamples(shown), Job.findAll({ where: { id: { [Op.in]: shown.map((sample) => sample.jobId) } }, raw: true }), Site.findAll({ raw: true }),
  ])
  const customers = await Customer.findAll({ where: { id: { [Op.in]: jobs.map(({ customerId }) => customerId) } }, raw: true })
  const items = shown.map((sample): SampleRow => {
    const view = views.get(sample.id)!
    const job = jobs.find(({ id }) => id === sample.jobId)!
    return {
      ...view, jobId: job.id, jobNumber: job.number, customerName: customers.find(({ id }) => id === job.customerId)?.name ?? '', siteName: sites.find(({ id }) => id === sample.siteId)?.name ?? '',
      tests: view.tests.map(({ label }) => label).join(', '), version: sample.version,
    }
  })
  return { items, next: samples.length > limit ? shown.at(-1)!.id : null }
}
