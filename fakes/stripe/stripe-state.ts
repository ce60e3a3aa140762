import * as z from 'zod'

const Metadata = z.record(z.string(), z.string())
const Seconds = z.int()

export const Line = z.strictObject({ id: z.string(), name: z.string(), description: z.string().nullable(), unitAmount: z.int(), quantity: z.int() })
export type Line = z.infer<typeof Line>

export const CheckoutRecord = z.strictObject({
  id: z.string(),
  created: Seconds,
  expiresAt: Seconds,
  status: z.enum(['open', 'complete', 'expired']),
  paymentStatus: z.enum(['paid', 'unpaid']),
  currency: z.string(),
  lines: z.array(Line),
  amountTotal: z.int(),
  reference: z.string().nullable(),
  customerEmail: z.string().nullable(),
  successUrl: z.string(),
  cancelUrl: z.string().nullable(),
  allowedPaymentMethodTypes: z.array(z.string()).nullable(),
  metadata: Metadata,
  paymentMetadata: Metadata,
  paymentDescription: z.string().nullable(),
  paymentId: z.string().nullable(),
})
export type CheckoutRecord = z.infer<typeof CheckoutRecord>

/** A payment intent and its one charge. */
export const PaymentRecord = z.strictObject({
  id: z.string(),
  chargeId: z.string(),
  created: Seconds,
  amount: z.int(),
  amountRefunded: z.int(),
  currency: z.string(),
  status: z.enum(['requires_payment_method', 'succeeded']),
  declined: z.boolean(),
  cardLast4: z.string(),
  receiptEmail: z.string().nullable(),
  description: z.string().nullable(),
  metadata: Metadata,
})
export type PaymentRecord = z.infer<typeof PaymentRecord>

export const RefundRecord = z.strictObject({
  id: z.string(),
  created: Seconds,
  amount: z.int(),
  paymentId: z.string(),
  reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).nullable(),
  metadata: Metadata,
})
export type RefundRecord = z.infer<typeof RefundRecord>

export const EventRecord = z.strictObject({
  id: z.string(),
  type: z.string(),
  created: Seconds,
  /** The body as it is sent and signed, so that a repeat is the same to the byte. */
  body: z.string(),
  delivery: z.strictObject({
    state: z.enum(['waiting', 'held', 'delivered', 'dropped', 'given-up']),
    attempts: z.int(),
    /** Milliseconds since 1970; null when no further attempt is planned. */
    nextAttemptAt: z.number().nullable(),
    lastAnswer: z.string().nullable(),
  }),
})
export type EventRecord = z.infer<typeof EventRecord>

export const IdempotencyRecord = z.strictObject({ request: z.string(), created: Seconds, status: z.int(), body: z.string() })
export type IdempotencyRecord = z.infer<typeof IdempotencyRecord>

/** All that the stand-in knows; what a restart brings back. */
export const StripeState = z.strictObject({
  checkouts: z.record(z.string(), CheckoutRecord),
  payments: z.record(z.string(), PaymentRecord),
  refunds: z.record(z.string(), RefundRecord),
  events: z.record(z.string(), EventRecord),
  idempotency: z.record(z.string(), IdempotencyRecord),
})
export type StripeState = z.infer<typeof StripeState>
