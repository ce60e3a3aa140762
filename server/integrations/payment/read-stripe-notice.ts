import Stripe from 'stripe'
import * as z from 'zod'
import { PaymentError } from './payment-error.ts'
import type { PaymentNotice } from './payment-gateway.ts'

const toleranceSeconds = 300

const Notice = z.object({
  id: z.string().min(1),
  type: z.string().min(1),
  created: z.int(),
  data: z.object({ object: z.object({ id: z.string(), object: z.string(), payment_intent: z.string().nullish() }) }),
})

/** Verifies a notice against each secret in turn (one has to match) and reads the few fields that say what to fetch. */
export function readStripeNotice(stripe: Stripe, secrets: string[], rawBody: Buffer, signature: string): PaymentNotice {
  const event = Notice.safeParse(verify(stripe, secrets, rawBody, signature))
  if (!event.success) throw new PaymentError('not-acceptable', `a signed notice of unknown shape: ${z.prettifyError(event.error)}`)
  const { id, type, created, data } = event.data
  const subject = data.object
  const paymentIntentId = subject.object === 'payment_intent' ? subject.id : subject.payment_intent
  return {
    id,
    type,
    ...(subject.object === 'checkout.session' && { checkoutId: subject.id }),
    ...(paymentIntentId && { paymentIntentId }),
    created: new Date(created * 1000),
  }
}

function verify(stripe: Stripe, secrets: string[], rawBody: Buffer, signature: string): unknown {
  let failure: unknown
  for (const secret of secrets) {
    try {
      return stripe.webhooks.constructEvent(rawBody, signature, secret, toleranceSeconds)
    } catch (error) {
      failure = error
    }
  }
  const detail = failure instanceof Stripe.errors.StripeSignatureVerificationError ? failure.message.split('\n')[0] : 'the body is not readable'
  throw new PaymentError('bad-signature', `payment notice refused: ${detail}`, { cause: failure })
}
