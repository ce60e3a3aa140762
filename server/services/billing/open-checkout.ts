import { Problem } from '../../../shared/problems.ts'
import { inTransaction, type Actor, type Tx } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { PaymentError } from '../../integrations/payment/payment-error.ts'
import type { CheckoutLine } from '../../integrations/payment/payment-gateway.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { Person } from '../../models/people/person.ts'
import { closePayment } from './close-payment.ts'
import { withPaymentService } from './with-payment-service.ts'

/**
 * The address of a payment's page, made at the payment service if it is not there yet. The payment's id is the idempotency
 * key and the request depends on nothing that may change, so that a repeat after a crash finds the same page.
 */
export async function openCheckout(paymentId: string, actor: Actor): Promise<string> {
  const payment = await Payment.findByPk(paymentId, { raw: true })
  if (payment?.url && payment.state === 'open') return payment.url
  const job = payment && (await Job.findByPk(payment.jobId, { raw: true }))
  const person = job && (await Person.findByPk(job.orderedById, { raw: true }))
  if (!payment || !job || !person || payment.state !== 'opening') throw gone()
  const checkout = await withPaymentService(() => createCheckout(payment, job, person.email, actor))
  const url = await inTransaction(actor, async (tx) => {
    const now = await lockPayment(payment, tx)
    if (now?.state === 'opening') await Payment.update({ state: 'open', checkoutId: checkout.id, url: checkout.url }, { where: { id: paymentId }, transaction: tx })
    else if (now?.state !== 'open') return null
    return checkout.url
  })
  if (url !== null) return url
  // closed by someone else meanwhile: the page must not stay open either
  await withPaymentService(() => outside().payment.expireCheckout(checkout.id))
  throw gone()
}

async function createCheckout(payment: Payment, job: Job, customerEmail: string, actor: Actor) {
  const { BASE_URL } = outside().settings
  const lines = job.lines.map(({ name, count, unitMinor }): CheckoutLine => ({ name, amountMinor: unitMinor, quantity: count }))
  try {
    return await outside().payment.createCheckout({
      reference: job.number,
      lines: job.taxMinor > 0 ? [...lines, { name: 'Tax', amountMinor: job.taxMinor, quantity: 1 }] : lines,
      currency: payment.currency,
      customerEmail,
      successUrl: `${BASE_URL}/jobs/${job.id}?payment=back`,
      cancelUrl: `${BASE_URL}/jobs/${job.id}?payment=left`,
      idempotencyKey: payment.id,
    })
  } catch (error) {
    // a refusal will be the same tomorrow: the draft must not stay locked behind a page that never was
    if (error instanceof PaymentError && error.reason === 'not-acceptable') {
      await inTransaction(actor, async (tx) => {
        const now = await lockPayment(payment, tx)
        if (now?.state === 'opening') await closePayment(now, tx)
      })
    }
    throw error
  }
}

/** The job is locked first, as everywhere, then its payment. */
async function lockPayment(payment: Payment, tx: Tx): Promise<Payment | null> {
  await Job.findByPk(payment.jobId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
  return Payment.findByPk(payment.id, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
}

const gone = () => new Problem('not-now', 'this payment was closed meanwhile; look at the job again')
