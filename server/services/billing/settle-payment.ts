import { inTransaction, type Actor } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import type { Checkout } from '../../integrations/payment/payment-gateway.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { promiseForOrder } from '../jobs/promise-for-order.ts'
import { closePayment } from './close-payment.ts'
import { placeJob } from './place-job.ts'

/**
 * Brings a payment in line with what the payment service says of it now. May be asked by a notice, by a returning client and by the
 * sweep, twice, late or all at once. A checkout that is not ours is left alone.
 */
export async function settlePayment(checkoutId: string, actor: Actor): Promise<void> {
  if ((await Payment.count({ where: { checkoutId } })) === 0) return
  await settleAs(await outside().payment.fetchCheckout(checkoutId), actor)
}

/** The same for a checkout that was fetched just now. */
export async function settleAs(checkout: Checkout, actor: Actor): Promise<void> {
  const known = await Payment.findOne({ where: { checkoutId: checkout.id }, raw: true })
  if (!known || (!checkout.paid && checkout.status === 'open')) return
  // worked out before anything is locked: planning takes a while
  const promise = checkout.paid && known.state === 'open' ? await promiseAt(known) : null
  await inTransaction(actor, async (tx) => {
    const job = await Job.findByPk(known.jobId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    const payment = await Payment.findByPk(known.id, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!job || !payment) return
    if (!checkout.paid) {
      if (checkout.status === 'expired' && payment.state === 'open') await closePayment(payment, tx)
      return
    }
    if (payment.state !== 'open' && payment.state !== 'closed') return
    const paid = { paidAt: new Date(), paymentIntentId: checkout.paymentIntentId }
    if (payment.state === 'open' && isAsAgreed(job, payment, checkout)) {
      await Payment.update({ ...paid, state: 'paid' }, { where: { id: payment.id }, transaction: tx })
      await placeJob(job, payment, promise, tx)
      return
    }
    // money for something that is not, or no longer, to be had at this price: it goes back in full
    await Payment.update({ ...paid, state: 'refund owed', amountMinor: checkout.amountMinor }, { where: { id: payment.id }, transaction: tx })
    if (job.state === 'draft' && payment.state === 'open') await Job.update({ waitsForPayment: false }, { where: { id: job.id }, transaction: tx })
    const { customerId, siteId } = payment
    tx.record({ type: 'payment.refund-owed', id: job.id, jobId: job.id, customerId, siteId, data: { paymentId: payment.id, amountMinor: checkout.amountMinor, text: `paid while the job was ${job.state}` } })
  })
}

function isAsAgreed(job: Job, payment: Payment, checkout: Checkout): boolean {
  const isSameOrder = job.state === 'draft' && job.version === payment.jobVersion && job.totalMinor === payment.amountMinor
  return isSameOrder && checkout.amountMinor === payment.amountMinor && checkout.currency === payment.currency
}

async function promiseAt({ jobId }: Payment): Promise<Date | null> {
  const job = await Job.findByPk(jobId, { raw: true })
  const [promise] = job ? await promiseForOrder({ ...job.order, siteId: job.siteId }, [job.siteId], new Date()) : []
  return promise?.finish ?? null
}
