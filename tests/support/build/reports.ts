import { Job } from '../../../server/models/jobs/job.ts'
import { Report } from '../../../server/models/reports/report.ts'
import { issueReport } from '../../../server/services/reports/issue-report.ts'
import { reviewRun } from '../../../server/services/test-runs/review-run.ts'
import { startRun } from '../../../server/services/test-runs/start-run.ts'
import type { Order } from '../../../shared/api/orders.ts'
import { makeReport } from '../../../worker/tasks/make-report.ts'
import { callerFor } from '../caller.ts'
import { runTask } from '../task.ts'
import { buildRight } from './benches.ts'
import { testPassword } from './people.ts'
import { buildReady, measure, type Lab, type Work } from './runs.ts'

/** A job whose tests are all measured and accepted; the lab's manager may sign for their method. */
export async function buildAcceptedJob(lab: Lab, order?: Order): Promise<Work & { job: Job }> {
  const work = await buildReady(lab, order)
  const reviewer = await callerFor(lab.reviewer)
  for (const test of work.tests) {
    const run = await measure(lab, await startRun(test.id, lab.hardness.id, await callerFor(lab.technician)))
    await reviewRun(run.id, { version: run.version, outcome: 'accepted', remark: '', readings: [] }, reviewer)
  }
  await buildRight(lab.manager, lab.site.id, 'sign')
  return { ...work, job: await jobNow(work.job.id) }
}

/** A report that was signed and whose file is still to be made. */
export async function buildOrderedReport(lab: Lab, order?: Order): Promise<Work & { report: Report }> {
  const work = await buildAcceptedJob(lab, order)
  await issueReport(work.job.id, { version: work.job.version, password: testPassword }, await callerFor(lab.manager))
  return { ...work, job: await jobNow(work.job.id), report: await reportNow(work.job.id) }
}

/** A report whose file is there. */
export async function buildIssuedReport(lab: Lab, order?: Order): Promise<Work & { report: Report }> {
  const work = await buildOrderedReport(lab, order)
  await runTask(makeReport, 'report.ordered')
  return work
}

export const jobNow = (jobId: string): Promise<Job> => Job.findByPk(jobId, { raw: true, rejectOnEmpty: true })

/** The newest revision. */
export function reportNow(jobId: string): Promise<Report> {
  return Report.findOne({ where: { jobId }, order: [['revision', 'DESC']], raw: true, rejectOnEmpty: true })
}
