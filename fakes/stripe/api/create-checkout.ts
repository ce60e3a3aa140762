import * as z from 'zod'
import { newId } from '../new-id.ts'
import type { CheckoutRecord } from '../stripe-state.ts'
import { StripeFailure } from './stripe-failure.ts'

const minutes = 60
const shortestLife = 30 * minutes
const longestLife = 24 * 60 * minutes
// Least charge by currency, in its smallest unit; 50 elsewhere.
const leastAmounts: Record<string, number> = { gbp: 30, sek: 300, nok: 300, dkk: 250, czk: 1500, pln: 200, huf: 17500, chf: 50, jpy: 50 }

const WholeNumber = z.string().regex(/^\d{1,12}$/, 'Invalid integer').transform(Number)
const Metadata = z.record(z.string().max(40), z.string().max(500))
const Address = z.url({ protocol: /^https?$/, error: 'Not a valid URL' })

export const CheckoutForm = z.strictObject({
  mode: z.literal('payment'),
  line_items: z
    .array(
      z.strictObject({
        quantity: WholeNumber.refine((quantity) => quantity >= 1, 'This value must be greater than or equal to 1.'),
        price_data: z.strictObject({
          currency: z.string().regex(/^[a-z]{3}$/, 'Invalid currency'),
          unit_amount: WholeNumber,
          product_data: z.strictObject({ name: z.string().min(1).max(5000), description: z.string().optional(), metadata: Metadata.optional() }),
        }),
      }),
    )
    .min(1)
    .max(100),
  allowed_payment_method_types: z.array(z.literal('card')).optional(),
  client_reference_id: z.string().max(200).optional(),
  customer_email: z.email('Invalid email address').optional(),
  success_url: Address,
  cancel_url: Address.optional(),
  expires_at: WholeNumber.optional(),
  metadata: Metadata.optional(),
  payment_intent_data: z.strictObject({ description: z.string().optional(), metadata: Metadata.optional(), receipt_email: z.email().optional() }).optional(),
  expand: z.array(z.string()).optional(),
})
export type CheckoutForm = z.infer<typeof CheckoutForm>

/** An open checkout from a request; its total is the sum of its lines. */
export function createCheckout(form: CheckoutForm): CheckoutRecord {
  const created = Math.floor(Date.now() / 1000)
  const expiresAt = form.expires_at ?? created + longestLife
  // A second of grace: the caller's clock was read before ours.
  if (expiresAt < created + shortestLife - 1) throw outOfRange('expires_at', 'The `expires_at` timestamp must be at least 30 minutes from Checkout Session creation.')
  if (expiresAt > created + longestLife) throw outOfRange('expires_at', 'The `expires_at` timestamp must be less than 24 hours from Checkout Session creation.')

  const currency = form.line_items[0]?.price_data.currency ?? ''
  if (form.line_items.some((line) => line.price_data.currency !== currency)) {
    throw outOfRange('line_items', 'All line items must have the same currency.')
  }
  const amountTotal = form.line_items.reduce((sum, line) => sum + line.quantity * line.price_data.unit_amount, 0)
  const least = leastAmounts[currency] ?? 50
  if (amountTotal < least) {
    const message = `The Checkout Session's total amount must convert to at least ${least} in the smallest unit of ${currency}.`
    throw new StripeFailure(400, { type: 'invalid_request_error', code: 'amount_too_small', message })
  }
  return {
    id: newId('cs_test', 58),
    created,
    expiresAt,
    status: 'open',
    paymentStatus: 'unpaid',
    currency,
    lines: form.line_items.map((line) => ({
      id: newId('li'),
      name: line.price_data.product_data.name,
      description: line.price_data.product_data.description ?? null,
      unitAmount: line.price_data.unit_amount,
      quantity: line.quantity,
    })),
    amountTotal,
    reference: form.client_reference_id ?? null,
    customerEmail: form.customer_email ?? null,
    successUrl: form.success_url,
    cancelUrl: form.cancel_url ?? null,
    allowedPaymentMethodTypes: form.allowed_payment_method_types ?? null,
    metadata: form.metadata ?? {},
    paymentMetadata: form.payment_intent_data?.metadata ?? {},
    paymentDescription: form.payment_intent_data?.description ?? null,
    paymentId: null,
  }
}

function outOfRange(param: string, message: string): StripeFailure {
  return new StripeFailure(400, { type: 'invalid_request_error', param, message })
}
