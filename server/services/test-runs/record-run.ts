import { Op } from 'sequelize'
import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import { evaluate, isRefused } from '../../../shared/evaluate.ts'
import type { Evaluation } from '../../../shared/method/method.ts'
import { methodOf } from '../../../shared/methods.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne } from '../../models/load.ts'
import { Result } from '../../models/runs/result.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { touchesOf } from '../samples/touches-of.ts'
import { engineInput, readingsOf } from './live-readings.ts'
import { loadOwnRun } from './load-own-run.ts'
import { runView } from './run-view.ts'

/** Hands a run over for review: the server works out the results from the readings it holds and keeps them with the run. */
export async function recordRun(testRunId: string, { version, remark }: { version: number; remark: string }, caller: Caller): Promise<TestRunView> {
  await inTransaction(caller, async (tx) => {
    const run = await loadOwnRun(testRunId, version, caller, tx)
    const test = (await Test.findByPk(run.testId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
    const evaluation = evaluated(run, test, engineInput(methodOf(run.methodId)!, test, await readingsOf(run.id, tx)))
    mustBeReviewable(evaluation, remark)

    const now = new Date()
    await TestRun.update({ state: 'recorded', recordedAt: now, evaluation, remark, methodVersion: methodOf(run.methodId)!.version, version: run.version + 1 }, { where: { id: run.id }, transaction: tx })
    await Result.bulkCreate(evaluation.results.map(({ key, symbol, value, unit, reported }, position) => ({
      testRunId: run.id, testId: test.id, sampleId: test.sampleId, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId, methodId: test.methodId, key, symbol, value, unit, reported, position,
    })), { transaction: tx })
    await Test.update({ state: 'recorded', version: test.version + 1 }, { where: { id: test.id }, transaction: tx })
    await Step.update({ state: 'done', endedAt: now }, { where: { id: run.stepId }, transaction: tx })
    await moveOn(test, tx)
    tx.record({ type: 'test-run.recorded', id: run.id, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId, data: { results: evaluation.results.map(({ symbol, reported }) => `${symbol} ${reported}`) }, touches: touchesOf(test, run.stepId) })
  })
  return runView(await loadOne(TestRun, 'TestRun', testRunId, caller), caller)
}

function evaluated(run: TestRun, test: Test, input: { parameters: Record<string, unknown>; readings: unknown }): Evaluation {
  const answer = evaluate({ method: run.methodId, ...input, ...(test.requirement && test.requirement.limits.length > 0 && { requirement: test.requirement }) })
  if (!isRefused(answer)) return answer as Evaluation
  const fields = Object.fromEntries(answer.error.issues.map(({ path, message }) => [path.join('.') || 'readings', message]))
  throw new Problem('not-acceptable', answer.error.issues[0]?.message ?? 'the readings do not make a result', fields)
}

function mustBeReviewable({ checks, results }: Evaluation, remark: string): void {
  const broken = checks.filter(({ severity }) => severity === 'error')
  if (broken.length > 0) throw new Problem('not-acceptable', broken.map(({ message }) => message).join(' '), Object.fromEntries(broken.map(({ code, reading, message }) => [reading === undefined ? code : `readings.${reading}`, message])))
  if (results.length === 0) throw new Problem('not-acceptable', 'there is no result to record')
  const warnings = checks.filter(({ severity }) => severity === 'warning')
  if (warnings.length > 0 && !remark) throw new Problem('not-acceptable', 'going on despite a warning needs a remark; it will stand in the report', { remark: warnings.map(({ message }) => message).join(' ') })
}

/** A sample whose steps are all done is done; a job whose tests are all recorded or accepted is in review. */
async function moveOn(test: Test, tx: Tx): Promise<void> {
  const left = await Step.count({ where: { sampleId: test.sampleId, state: { [Op.notIn]: ['done', 'void'] } }, transaction: tx })
  if (left === 0) await Sample.update({ state: 'done' }, { where: { id: test.sampleId, state: 'in work' }, transaction: tx })
  const open = await Test.count({ where: { jobId: test.jobId, state: { [Op.notIn]: ['recorded', 'accepted', 'void'] } }, transaction: tx })
  if (open > 0) return
  const [moved] = await Job.update({ state: 'in review' }, { where: { id: test.jobId, state: 'in work' }, transaction: tx })
  if (moved > 0) tx.record({ type: 'job.in-review', id: test.jobId, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId })
}
