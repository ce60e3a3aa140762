import { Op, QueryTypes } from 'sequelize'
import type { SampleInJob } from '../../../shared/api/jobs.ts'
import type { Traveller } from '../../../shared/api/basics.ts'
import type { JobNow } from '../../../shared/travellers/sample-traveller.ts'
import { database } from '../../database/connection.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Site } from '../../models/sites/site.ts'
import { sampleViews } from '../jobs/view/sample-views.ts'

/** Samples of any jobs as people see them, by id. */
export async function viewsOfSamples(samples: readonly Sample[]): Promise<Map<string, SampleInJob>> {
  if (samples.length === 0) return new Map()
  const jobs = await Job.findAll({ where: { id: { [Op.in]: [...new Set(samples.map(({ jobId }) => jobId))] } }, raw: true })
  const sites = await Site.findAll({ where: { id: { [Op.in]: [...new Set(jobs.map(({ siteId }) => siteId))] } }, raw: true })
  const reports = await newestReports(jobs.map(({ id }) => id))
  const views = await Promise.all(jobs.map((job) => sampleViews(samples.filter(({ jobId }) => jobId === job.id), {
    state: job.state, placedAt: job.placedAt?.toISOString() ?? null, expectedAt: job.expectedAt?.toISOString() ?? null, report: reports.get(job.id) ?? null,
    siteName: sites.find(({ id }) => id === job.siteId)?.name ?? '',
  })))
  return new Map(views.flat().map((view) => [view.id, view]))
}

/** The traveller line of each of these samples. */
export async function travellersOf(sampleIds: readonly string[]): Promise<Map<string, Traveller>> {
  const samples = await Sample.findAll({ where: { id: { [Op.in]: [...sampleIds] } }, raw: true })
  return new Map([...(await viewsOfSamples(samples)).values()].map(({ id, traveller }) => [id, traveller]))
}

async function newestReports(jobIds: readonly string[]): Promise<Map<string, JobNow['report']>> {
  const rows = await database.query<{ jobId: string; state: NonNullable<JobNow['report']>['state']; issuedAt: Date }>(
    `select distinct on (r.job_id) r.job_id as "jobId", s.state, r.issued_at as "issuedAt" from reports r join report_states s on s.report_id = r.id where r.job_id = any($1::uuid[]) order by r.job_id, r.revision desc`,
    { bind: [jobIds], type: QueryTypes.SELECT },
  )
  return new Map(rows.map(({ jobId, state, issuedAt }) => [jobId, { state, issuedAt: issuedAt.toISOString() }]))
}
