import { Op, QueryTypes } from 'sequelize'
import type { JobRow } from '../../../../shared/api/jobs.ts'
import { jobTraveller } from '../../../../shared/travellers/job-traveller.ts'
import type { Caller } from '../../../caller.ts'
import { database } from '../../../database/connection.ts'
import type { ReportState } from '../../../models/reports/report-state.ts'
import type { Job } from '../../../models/jobs/job.ts'
import { Customer } from '../../../models/people/customer.ts'
import { Site } from '../../../models/sites/site.ts'
import { jobTallies } from './job-tallies.ts'
import { daysLate } from './job-view.ts'

type Newest = { jobId: string; id: string; number: string; state: ReportState['state']; issuedAt: Date }

/** Jobs as rows of a list, in the order given. */
export async function jobRows(jobs: readonly Job[], caller: Caller): Promise<JobRow[]> {
  const ids = jobs.map(({ id }) => id)
  const sites = await Site.findAll({ where: { id: { [Op.in]: jobs.map(({ siteId }) => siteId) } }, raw: true })
  const customers = await Customer.findAll({ where: { id: { [Op.in]: jobs.map(({ customerId }) => customerId) } }, attributes: ['id', 'name'], raw: true })
  const tallies = await jobTallies(ids)
  const reports = caller.ability.can('read', 'Report') ? await newestReports(ids) : []
  return jobs.map((job) => {
    const site = sites.find(({ id }) => id === job.siteId)
    const newest = reports.find(({ jobId }) => jobId === job.id)
    const report = newest ? { state: newest.state, issuedAt: newest.issuedAt.toISOString() } : null
    const tally = tallies.get(job.id)
    const { id, number, purchaseOrder, what, tests, state, money, waitsForPayment, holds, neededBy, totalMinor, currency } = job
    const dates = { placedAt: job.placedAt?.toISOString() ?? null, expectedAt: job.expectedAt?.toISOString() ?? null }
    return {
      id, number, purchaseOrder, what, tests, state, money, waitsForPayment, holds, neededBy, totalMinor, currency, expectedAt: dates.expectedAt, createdAt: job.createdAt.toISOString(),
      customerName: customers.find((customer) => customer.id === job.customerId)?.name ?? '', siteName: site?.name ?? '',
      traveller: state === 'draft' || !tally ? [] : jobTraveller({ job: { state, ...dates, report }, ...tally, closed: true }),
      lateDays: daysLate(job, site?.timeZone ?? 'UTC', report?.issuedAt ?? null),
      report: newest ? { id: newest.id, number: newest.number, issuedAt: newest.issuedAt.toISOString() } : null,
    }
  })
}

/** The newest revision of each job's report. */
function newestReports(jobIds: readonly string[]): Promise<Newest[]> {
  return database.query<Newest>(
    `select distinct on (r.job_id) r.job_id as "jobId", r.id, r.number || '/' || r.revision as number, s.state, r.issued_at as "issuedAt"
     from reports r join report_states s on s.report_id = r.id where r.job_id = any($1) order by r.job_id, r.id desc`,
    { bind: [jobIds], type: QueryTypes.SELECT },
  )
}
