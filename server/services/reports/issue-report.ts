import { v7 } from 'uuid'
import type { Job as JobView } from '../../../shared/api/jobs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { notYetReportable } from '../../../shared/orders/not-yet-reportable.ts'
import { Problem } from '../../../shared/problems.ts'
import { buildContent } from '../../../shared/reports/build-content.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { limits } from '../../integrations/limits/limits.ts'
import { outside } from '../../integrations/outside.ts'
import { Job } from '../../models/jobs/job.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { Person } from '../../models/people/person.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import { Report } from '../../models/reports/report.ts'
import { Site } from '../../models/sites/site.ts'
import { jobView } from '../jobs/view/job-view.ts'
import { isPassword } from '../people/password/hash-password.ts'
import { authorisedUntil } from '../test-runs/authorised-until.ts'
import { loadReported } from './load-reported.ts'
import { newReportCode } from './report-code.ts'

type Signed = { version: number; password: string; address?: string }

/** Signs a job's report: what it says is frozen now, the worker makes its file. `address` is where the request comes from, for the limit on guessing passwords. */
export async function issueReport(jobId: string, { version, password, address = 'unknown' }: Signed, caller: Caller): Promise<JobView> {
  const seen = await loadOne(Job, 'Job', jobId, caller)
  must(caller, 'issue', 'Report', { siteId: seen.siteId, customerId: seen.customerId })
  await mustKnowPassword(password, address, caller)
  await inTransaction(caller, async (tx) => {
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    must(caller, 'issue', 'Report', { siteId: job.siteId, customerId: job.customerId })
    const tests = await Test.findAll({ where: { jobId }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    const because = notYetReportable({ state: job.state, holds: job.holds, tests })
    if (because) throw new Problem('not-now', `the report of ${job.number} cannot be issued: ${because}`)
    mustBeCurrent(job, version, 'This job')
    await mustBeSignatory(job, tests, caller, tx)
    await writeReport(job, caller, tx)
    await Test.update({ state: 'reported' }, { where: { jobId, state: 'accepted' }, transaction: tx })
    await Job.update({ state: job.state === 'closed' ? 'closed' : 'reported', version: job.version + 1 }, { where: { id: jobId }, transaction: tx })
  })
  return jobView(jobId, caller)
}

async function mustKnowPassword(password: string, address: string, caller: Caller): Promise<void> {
  const attempt = await limits().tryPassword(caller.person.email, address)
  const person = await Person.findByPk(caller.person.id, { raw: true })
  if (!(await isPassword(person?.passwordHash ?? null, password))) throw new Problem('not-acceptable', 'signing needs your password, and this is not it', { password: 'is not your password' })
  await attempt.succeeded()
}

/** Who signs answers for every method in the report, today. */
async function mustBeSignatory(job: Job, tests: readonly Test[], caller: Caller, tx: Tx): Promise<void> {
  const site = (await Site.findByPk(job.siteId, { raw: true, transaction: tx }))!
  const used = [...new Set(tests.filter(({ state }) => state !== 'void').map(({ methodId }) => methodId))]
  for (const methodId of used) {
    if (await authorisedUntil(caller.person.id, methodId, 'sign', site.timeZone, tx)) continue
    throw new Problem('not-allowed', `You are not authorised to sign reports of ${methodOf(methodId)?.title ?? methodId}, or the authorisation has ended.`)
  }
}

/** The frozen report and its first state. A further revision has to say something else than the one before. */
async function writeReport(job: Job, caller: Caller, tx: Tx): Promise<void> {
  const earlier = await Report.findOne({ where: { jobId: job.id }, order: [['revision', 'DESC']], raw: true, transaction: tx })
  if (earlier && (await ReportState.count({ where: { reportId: earlier.id, state: 'being made' }, transaction: tx }))) throw new Problem('not-now', `report ${earlier.number}/${earlier.revision} is still being made`)
  const [id, issuedAt, number, revision] = [v7(), new Date(), earlier?.number ?? job.number.replace(/^J/, 'R'), (earlier?.revision ?? 0) + 1]
  const report = { number, revision, issuedAt, code: newReportCode(), checkAddress: `${outside().settings.BASE_URL}/check`, signatory: { name: caller.person.name, role: `${caller.person.role}, authorised signatory` } }
  const content = buildContent({ ...(await loadReported(job, tx)), report, earlier: earlier?.content ?? null })
  if (content.supersedes?.changes.length === 0) throw new Problem('not-now', `nothing has changed since ${content.supersedes.number}; there is nothing to correct`)
  const { customerId, siteId } = job
  await Report.create({ id, jobId: job.id, customerId, siteId, number, revision, code: report.code, content, signedById: caller.person.id, issuedAt }, { transaction: tx })
  await ReportState.create({ reportId: id, state: 'being made' }, { transaction: tx })
  const about = { jobId: job.id, customerId, siteId, data: { number: `${number}/${revision}`, text: `${number}/${revision}` } }
  tx.record({ type: 'report.ordered', id, ...about, touches: [{ subject: 'Job', id: job.id }, { subject: 'Sample', id: job.id }] })
  if (job.state !== 'reported' && job.state !== 'closed') tx.record({ type: 'job.reported', id: job.id, ...about })
}
