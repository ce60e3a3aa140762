import { Op } from 'sequelize'
import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { Reading } from '../../models/runs/reading.ts'
import { Review } from '../../models/runs/review.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { Site } from '../../models/sites/site.ts'
import { touchesOf } from '../samples/touches-of.ts'
import { authorisedUntil } from './authorised-until.ts'
import { runView } from './run-view.ts'

type Said = { version: number; outcome: 'accepted' | 'sent back'; remark: string; readings: string[] }

/** A second authorised person accepts a run or sends it back with reasons. Nobody reviews an own run. */
export async function reviewRun(testRunId: string, { version, outcome, remark, readings }: Said, caller: Caller): Promise<TestRunView> {
  await inTransaction(caller, async (tx) => {
    const run = await loadOne(TestRun, 'TestRun', testRunId, caller, { tx, lock: true })
    must(caller, 'review', 'TestRun', run)
    const site = (await Site.findByPk(run.siteId, { raw: true, transaction: tx }))!
    const title = methodOf(run.methodId)?.title ?? run.methodId
    if (!(await authorisedUntil(caller.person.id, run.methodId, 'review', site.timeZone, tx))) throw new Problem('not-allowed', `You are not authorised to review ${title}, or the authorisation has ended.`)
    if (run.state !== 'recorded') throw new Problem('not-now', run.state === 'open' ? 'this run is still at the bench' : `this run is ${run.state} already`)
    mustBeCurrent(run, version, 'This run')
    if (outcome === 'accepted' && !(await authorisedUntil(run.performedById, run.methodId, 'carry out', site.timeZone, tx))) {
      throw new Problem('not-allowed', `The authorisation to carry out ${title} of the person who ran this test has ended. It cannot be accepted.`)
    }
    if (readings.length > 0 && (await Reading.count({ where: { id: { [Op.in]: readings }, testRunId: run.id }, transaction: tx })) !== new Set(readings).size) {
      throw new Problem('not-acceptable', 'some of these readings are not of this run', { readings: 'are not all of this run' })
    }
    const test = (await Test.findByPk(run.testId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
    await Review.create({ testRunId: run.id, outcome, remark, readings, byId: caller.person.id }, { transaction: tx })
    await TestRun.update({ state: outcome, version: run.version + 1 }, { where: { id: run.id }, transaction: tx })
    await Test.update({ state: outcome === 'accepted' ? 'accepted' : 'ready', version: test.version + 1 }, { where: { id: test.id }, transaction: tx })
    if (outcome === 'sent back') await sendBack(run, test, tx)
    tx.record({ type: outcome === 'accepted' ? 'test-run.accepted' : 'test-run.sent-back', id: run.id, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId, data: { remark }, touches: touchesOf(test, run.stepId) })
  })
  return runView(await loadOne(TestRun, 'TestRun', testRunId, caller), caller)
}

/** The measuring step is to do again; the earlier run stays on record. */
async function sendBack(run: TestRun, test: Test, tx: Tx): Promise<void> {
  await Step.update({ state: 'to come', benchId: null, startedAt: null, startedById: null, endedAt: null }, { where: { id: run.stepId }, transaction: tx })
  await Sample.update({ state: 'in work' }, { where: { id: test.sampleId, state: 'done' }, transaction: tx })
  await Job.update({ state: 'in work' }, { where: { id: test.jobId, state: 'in review' }, transaction: tx })
}
