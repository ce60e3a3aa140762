import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Hold } from '../../models/jobs/hold.ts'
import { Job } from '../../models/jobs/job.ts'
import { PlanEntry } from '../../models/jobs/plan-entry.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { jobView } from './view/job-view.ts'

/** Calls a job off before its samples are in work. What was paid is owed back, and a task pays it. */
export async function cancelJob(jobId: string, { version, reason }: { version: number; reason: string }, caller: Caller) {
  await inTransaction(caller, async (tx) => {
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    must(caller, 'cancel', 'Job', job)
    mustBeCurrent(job, version, 'This job')
    if (job.state === 'draft') throw new Problem('not-now', `job ${job.number} is a draft; discard it instead`)
    if (job.state !== 'placed' && job.state !== 'awaiting samples') throw new Problem('not-now', `job ${job.number} is ${job.state}; it can be cancelled until its samples are in work`)
    if (await Step.count({ where: { jobId, state: ['started', 'done'] }, transaction: tx })) throw new Problem('not-now', `work on ${job.number} has begun; it can no longer be cancelled`)
    await endWork(jobId, tx)
    await Job.update({ state: 'cancelled', holds: 0, expectedAt: null, version: job.version + 1 }, { where: { id: jobId }, transaction: tx })
    const about = { jobId, customerId: job.customerId, siteId: job.siteId }
    tx.record({ type: 'job.cancelled', id: jobId, ...about, data: { number: job.number, reason, text: reason }, touches: [{ subject: 'Sample', id: jobId }, { subject: 'PlanEntry', id: jobId }, { subject: 'Hold', id: jobId }] })
    for (const payment of await Payment.findAll({ where: { jobId, state: 'paid' }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })) {
      await Payment.update({ state: 'refund owed' }, { where: { id: payment.id }, transaction: tx })
      tx.record({ type: 'payment.refund-owed', id: jobId, ...about, data: { paymentId: payment.id, amountMinor: payment.amountMinor, text: 'the job was cancelled' } })
    }
  })
  return jobView(jobId, caller)
}

async function endWork(jobId: string, tx: Tx): Promise<void> {
  const here = { where: { jobId }, transaction: tx }
  const steps = await Step.findAll({ ...here, attributes: ['id'], raw: true })
  await PlanEntry.destroy({ where: { stepId: steps.map(({ id }) => id) }, transaction: tx })
  await Step.update({ state: 'void' }, here)
  await Test.update({ state: 'void' }, here)
  await Sample.update({ state: 'void', onHold: false }, here)
  await Hold.update({ releasedAt: new Date() }, { where: { jobId, releasedAt: null }, transaction: tx })
}
