import type { Tx } from '../../database/transaction.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'

/** Ends a payment that nobody made; the draft may change again. The job must be locked. */
export async function closePayment(payment: Payment, tx: Tx): Promise<void> {
  const { id, jobId, customerId, siteId } = payment
  await Payment.update({ state: 'closed' }, { where: { id }, transaction: tx })
  await Job.update({ waitsForPayment: false }, { where: { id: jobId }, transaction: tx })
  tx.record({ type: 'job.checkout-closed', id: jobId, jobId, customerId, siteId, data: { paymentId: id } })
}
