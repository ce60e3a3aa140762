import { inTransaction, type Actor } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { Invoice } from '../../models/billing/invoice.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'

/** Pays back in full what is owed. The key makes a repeat the same refund, whichever process asks. */
export async function refundPayment(paymentId: string, actor: Actor): Promise<void> {
  const payment = await Payment.findByPk(paymentId, { raw: true })
  if (payment?.state !== 'refund owed') return
  const { jobId, customerId, siteId, amountMinor, paymentIntentId, currency } = payment
  if (!paymentIntentId) throw new Error(`payment ${paymentId} is owed back, but the payment service named no payment`)
  const refund = await outside().payment.refund({ paymentIntentId, amountMinor, idempotencyKey: `refund-${paymentId}` })
  if (refund.status === 'failed' || refund.status === 'canceled') throw new Error(`the refund ${refund.id} of payment ${paymentId} has ${refund.status}`)
  await inTransaction(actor, async (tx) => {
    const job = await Job.findByPk(jobId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    const [changed] = await Payment.update({ state: 'refunded', refundId: refund.id }, { where: { id: paymentId, state: 'refund owed' }, transaction: tx })
    if (changed === 0 || !job) return
    // money that came a second time never was on an invoice; the job keeps what pays for it
    const isForJob = job.state === 'cancelled' && job.money === 'paid'
    const invoice = isForJob ? await Invoice.findOne({ where: { jobId }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE }) : null
    if (invoice) {
      await Invoice.update({ refundedMinor: Math.min(invoice.paidMinor, amountMinor) }, { where: { id: invoice.id }, transaction: tx })
      await Job.update({ money: 'refunded', version: job.version + 1 }, { where: { id: jobId }, transaction: tx })
    }
    tx.record({ type: 'payment.refunded', id: invoice?.id ?? paymentId, jobId, customerId, siteId, data: { paymentId, refundId: refund.id, amountMinor, currency }, touches: [{ subject: 'Job', id: jobId }] })
  })
}
