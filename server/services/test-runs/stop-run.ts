import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne } from '../../models/load.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { touchesOf } from '../samples/touches-of.ts'
import { loadOwnRun } from './load-own-run.ts'
import { runView } from './run-view.ts'

/** Gives an open run up with a reason; it stays on record and the test is ready for another. */
export async function stopRun(testRunId: string, { version, reason }: { version: number; reason: string }, caller: Caller): Promise<TestRunView> {
  await inTransaction(caller, async (tx) => {
    const run = await loadOwnRun(testRunId, version, caller, tx)
    const test = (await Test.findByPk(run.testId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
    await TestRun.update({ state: 'stopped', remark: reason, version: run.version + 1 }, { where: { id: run.id }, transaction: tx })
    await Test.update({ state: 'ready', version: test.version + 1 }, { where: { id: test.id }, transaction: tx })
    await Step.update({ state: 'to come', benchId: null, startedAt: null, startedById: null }, { where: { id: run.stepId }, transaction: tx })
    tx.record({ type: 'test-run.stopped', id: run.id, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId, data: { reason }, touches: touchesOf(test, run.stepId) })
  })
  return runView(await loadOne(TestRun, 'TestRun', testRunId, caller), caller)
}
