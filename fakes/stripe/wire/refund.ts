import type Stripe from 'stripe'
import type { PaymentRecord, RefundRecord } from '../stripe-state.ts'

/** A refund as Stripe's API writes it; here every refund succeeds at once. */
export function refund(record: RefundRecord, payment: PaymentRecord): Omit<Stripe.Refund, 'lastResponse'> {
  return {
    id: record.id,
    object: 'refund',
    amount: record.amount,
    balance_transaction: null,
    charge: payment.chargeId,
    created: record.created,
    currency: payment.currency,
    customer: null,
    customer_account: null,
    destination_details: { type: 'card', card: { type: 'refund', reference_status: 'pending', reference_type: 'acquirer_reference_number' } },
    metadata: record.metadata,
    payment_intent: payment.id,
    payment_method: null,
    reason: record.reason,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  }
}
