import type { StripeState, CheckoutRecord, PaymentRecord, RefundRecord } from '../stripe-state.ts'
import { newId } from '../new-id.ts'
import { StripeFailure } from '../api/stripe-failure.ts'
import { found } from '../api/found.ts'
import { charge } from '../wire/charge.ts'
import { checkoutSession } from '../wire/checkout-session.ts'
import { paymentIntent } from '../wire/payment-intent.ts'

export type PaymentsOptions = {
  state: StripeState
  payUrl: (checkoutId: string) => string
  /** Records an event about an object and sends it. */
  announce: (type: string, object: { id: string }) => void
}

export type NewRefund = Pick<RefundRecord, 'reason' | 'metadata'> & { paymentId: string; amount: number | undefined }

export type Payments = ReturnType<typeof createPayments>

/** What can happen to a checkout and its payment; the caller saves the state afterwards. */
export function createPayments({ state, payUrl, announce }: PaymentsOptions) {
  const now = () => Math.floor(Date.now() / 1000)
  const session = (checkout: CheckoutRecord) => checkoutSession(checkout, payUrl(checkout.id))

  const close = (checkout: CheckoutRecord) => {
    checkout.status = 'expired'
    announce('checkout.session.expired', session(checkout))
  }
  /** A declined card leaves its payment behind; the next try uses the same one, as Stripe does. */
  const paymentOf = (checkout: CheckoutRecord): PaymentRecord => {
    if (checkout.paymentId) return found(state.payments, checkout.paymentId, 'payment_intent')
    const payment: PaymentRecord = {
      id: newId('pi'),
      chargeId: newId('ch'),
      created: now(),
      amount: checkout.amountTotal,
      amountRefunded: 0,
      currency: checkout.currency,
      status: 'requires_payment_method',
      declined: false,
      cardLast4: '',
      receiptEmail: checkout.customerEmail,
      description: checkout.paymentDescription,
      metadata: checkout.paymentMetadata,
    }
    state.payments[payment.id] = payment
    checkout.paymentId = payment.id
    return payment
  }
  const attempt = (checkout: CheckoutRecord, cardLast4: string): PaymentRecord => {
    const payment = paymentOf(checkout)
    payment.chargeId = newId('ch')
    payment.cardLast4 = cardLast4
    return payment
  }

  return {
    /** True when the checkout was still open: paying twice changes nothing. */
    pay(checkout: CheckoutRecord, cardLast4: string): boolean {
      if (checkout.status !== 'open') return false
      const payment = attempt(checkout, cardLast4)
      payment.status = 'succeeded'
      payment.declined = false
      checkout.status = 'complete'
      checkout.paymentStatus = 'paid'
      announce('payment_intent.succeeded', paymentIntent(payment))
      announce('checkout.session.completed', session(checkout))
      return true
    },

    decline(checkout: CheckoutRecord, cardLast4: string): void {
      if (checkout.status !== 'open') return
      const payment = attempt(checkout, cardLast4)
      payment.declined = true
      announce('payment_intent.payment_failed', paymentIntent(payment))
    },

    expire(checkout: CheckoutRecord): void {
      if (checkout.status !== 'open') {
        const message = `Only Checkout Sessions with a status in ["open"] can be expired. This Checkout Session has a status of \`${checkout.status}\`.`
        throw new StripeFailure(400, { type: 'invalid_request_error', message })
      }
      close(checkout)
    },

    /** True when some checkout ran out of time. */
    expireOverdue(): boolean {
      const overdue = Object.values(state.checkouts).filter((checkout) => checkout.status === 'open' && checkout.expiresAt <= now())
      overdue.forEach(close)
      return overdue.length > 0
    },

    refund({ paymentId, amount, reason, metadata }: NewRefund): RefundRecord {
      const payment = found(state.payments, paymentId, 'payment_intent', 'payment_intent')
      const left = payment.amount - payment.amountRefunded
      if (payment.status !== 'succeeded') {
        throw new StripeFailure(400, { type: 'invalid_request_error', message: 'This PaymentIntent does not have a successful charge to refund.' })
      }
      if (left === 0) {
        throw new StripeFailure(400, { type: 'invalid_request_error', code: 'charge_already_refunded', message: `Charge ${payment.chargeId} has already been refunded.` })
      }
      const asked = amount ?? left
      if (asked > left) {
        const message = `Refund amount (${asked}) is greater than unrefunded amount on charge (${left})`
        throw new StripeFailure(400, { type: 'invalid_request_error', param: 'amount', message })
      }
      const record: RefundRecord = { id: newId('re'), created: now(), amount: asked, paymentId, reason, metadata }
      state.refunds[record.id] = record
      payment.amountRefunded += asked
      announce('charge.refunded', charge(payment))
      return record
    },
  }
}
