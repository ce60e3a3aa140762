import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { jobView } from '../jobs/view/job-view.ts'
import { closePayment } from './close-payment.ts'
import { settleAs } from './settle-payment.ts'
import { withPaymentService } from './with-payment-service.ts'

/** Closes an open payment page so that the draft can change again. A page that was paid first places the job instead. */
export async function reopenDraft(jobId: string, { version }: { version: number }, caller: Caller) {
  const open = await inTransaction(caller, async (tx) => {
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    must(caller, 'pay', 'Job', job)
    mustBeCurrent(job, version, 'This draft')
    if (job.state !== 'draft') throw new Problem('not-now', `job ${job.number} is ${job.state}; only a draft can change`)
    const payment = await Payment.findOne({ where: { jobId, state: ['opening', 'open'] }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    // nobody was ever told the address of a page that is still opening
    if (payment?.state === 'opening') await closePayment(payment, tx)
    return payment?.state === 'open' ? payment : null
  })
  const checkoutId = open?.checkoutId
  if (checkoutId) await withPaymentService(async () => settleAs(await outside().payment.expireCheckout(checkoutId), caller))
  return jobView(jobId, caller)
}
