import type Stripe from 'stripe'
import type { PaymentRecord } from '../stripe-state.ts'

/** A payment intent as Stripe's API writes it. */
export function paymentIntent(payment: PaymentRecord): Omit<Stripe.PaymentIntent, 'lastResponse'> {
  const paid = payment.status === 'succeeded'
  return {
    id: payment.id,
    object: 'payment_intent',
    allowed_payment_method_types: ['card'],
    amount: payment.amount,
    amount_capturable: 0,
    amount_received: paid ? payment.amount : 0,
    application: null,
    application_fee_amount: null,
    automatic_payment_methods: null,
    canceled_at: null,
    cancellation_reason: null,
    capture_method: 'automatic_async',
    client_secret: null,
    confirmation_method: 'automatic',
    created: payment.created,
    currency: payment.currency,
    customer: null,
    customer_account: null,
    description: payment.description,
    excluded_payment_method_types: null,
    last_payment_error: payment.declined
      ? { type: 'card_error', code: 'card_declined', decline_code: 'generic_decline', message: 'Your card was declined.', charge: payment.chargeId }
      : null,
    latest_charge: payment.chargeId,
    livemode: false,
    metadata: payment.metadata,
    managed_payments: null,
    next_action: null,
    on_behalf_of: null,
    payment_method: null,
    payment_method_configuration_details: null,
    payment_method_options: {},
    payment_method_types: ['card'],
    payment_record: null,
    processing: null,
    receipt_email: payment.receiptEmail,
    review: null,
    setup_future_usage: null,
    shipping: null,
    source: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: payment.status,
    transfer_data: null,
    transfer_group: null,
  }
}
