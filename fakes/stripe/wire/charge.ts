import type { PaymentRecord } from '../stripe-state.ts'

/** The charge of a payment: what a refund changes. */
export function charge(payment: PaymentRecord) {
  const paid = payment.status === 'succeeded'
  return {
    id: payment.chargeId,
    object: 'charge',
    amount: payment.amount,
    amount_captured: paid ? payment.amount : 0,
    amount_refunded: payment.amountRefunded,
    balance_transaction: null,
    billing_details: { address: null, email: payment.receiptEmail, name: null, phone: null, tax_id: null },
    captured: paid,
    created: payment.created,
    currency: payment.currency,
    customer: null,
    description: payment.description,
    disputed: false,
    failure_code: payment.declined ? 'card_declined' : null,
    failure_message: payment.declined ? 'Your card was declined.' : null,
    livemode: false,
    metadata: payment.metadata,
    paid,
    payment_intent: payment.id,
    payment_method_details: { type: 'card', card: { brand: 'unknown', last4: payment.cardLast4, funding: 'credit', country: null } },
    receipt_email: payment.receiptEmail,
    receipt_url: null,
    refunded: paid && payment.amountRefunded === payment.amount,
    status: paid ? 'succeeded' : 'failed',
  }
}
