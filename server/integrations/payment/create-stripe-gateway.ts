import Stripe from 'stripe'
import { PaymentError } from './payment-error.ts'
import type { Checkout, PaymentGateway, Refund } from './payment-gateway.ts'
import { readStripeNotice } from './read-stripe-notice.ts'

export type StripeGatewayOptions = {
  secretKey: string
  /** Comma separated: during a rotation the old and the new secret are both valid. */
  webhookSecret: string
  /** Another address that speaks Stripe's wire format; Stripe itself when left out. */
  apiBase?: string
  timeoutMs?: number
  maxNetworkRetries?: number
}

/** The payment gateway by Stripe's SDK: hosted Checkout for cards, one payment per checkout. */
export function createStripeGateway(options: StripeGatewayOptions): PaymentGateway {
  const secrets = options.webhookSecret.split(',').map((secret) => secret.trim()).filter((secret) => secret !== '')
  if (secrets.length === 0) throw new Error('STRIPE_WEBHOOK_SECRET names no secret')
  const stripe = new Stripe(options.secretKey, {
    ...address(options.apiBase),
    timeout: options.timeoutMs ?? 10_000,
    maxNetworkRetries: options.maxNetworkRetries ?? 2,
    telemetry: false,
  })

  const fetchCheckout = async (id: string): Promise<Checkout> => toCheckout(await asPaymentError(() => stripe.checkout.sessions.retrieve(id)))

  return {
    async createCheckout(checkout) {
      const session = await asPaymentError(() =>
        stripe.checkout.sessions.create(
          {
            mode: 'payment',
            // Cards only: with methods that settle days later `complete` would not yet be an answer.
            allowed_payment_method_types: ['card'],
            client_reference_id: checkout.reference,
            customer_email: checkout.customerEmail,
            line_items: checkout.lines.map((line) => ({
              quantity: line.quantity,
              price_data: { currency: checkout.currency.toLowerCase(), unit_amount: line.amountMinor, product_data: { name: line.name } },
            })),
            payment_intent_data: { metadata: { reference: checkout.reference } },
            success_url: checkout.successUrl,
            cancel_url: checkout.cancelUrl,
            ...(checkout.expiresAt && { expires_at: Math.floor(checkout.expiresAt.getTime() / 1000) }),
          },
          { idempotencyKey: checkout.idempotencyKey },
        ),
      )
      if (!session.url) throw new PaymentError('unavailable', `the payment service gave checkout ${session.id} no address`)
      return { id: session.id, url: session.url }
    },

    fetchCheckout,

    async expireCheckout(id) {
      try {
        return toCheckout(await asPaymentError(() => stripe.checkout.sessions.expire(id)))
      } catch (error) {
        // Refused because it is no longer open: what it has become is the answer.
        if (error instanceof PaymentError && error.reason === 'not-acceptable') return fetchCheckout(id)
        throw error
      }
    },

    async refund(request) {
      const refund = await asPaymentError(() =>
        stripe.refunds.create(
          { payment_intent: request.paymentIntentId, amount: request.amountMinor },
          { idempotencyKey: request.idempotencyKey },
        ),
      )
      return toRefund(refund)
    },

    fetchRefund: async (id) => toRefund(await asPaymentError(() => stripe.refunds.retrieve(id))),

    readNotice: (rawBody, signature) => readStripeNotice(stripe, secrets, rawBody, signature),
  }
}

function address(apiBase: string | undefined): { host?: string; port?: number; protocol?: 'http' | 'https' } {
  if (!apiBase) return {}
  const url = new URL(apiBase)
  const protocol = url.protocol === 'http:' ? 'http' : 'https'
  return { host: url.hostname, port: url.port ? Number(url.port) : protocol === 'http' ? 80 : 443, protocol }
}

const checkoutStatuses = ['open', 'complete', 'expired'] as const

function toCheckout(session: Stripe.Checkout.Session): Checkout {
  const status = checkoutStatuses.find((known) => known === session.status)
  if (!status || session.amount_total === null || session.currency === null) {
    throw new PaymentError('unavailable', `the payment service told no usable state or amount of checkout ${session.id}`)
  }
  return {
    id: session.id,
    status,
    paid: session.payment_status === 'paid',
    paymentIntentId: idOf(session.payment_intent),
    amountMinor: session.amount_total,
    currency: session.currency.toUpperCase(),
    reference: session.client_reference_id,
    url: session.url,
  }
}

const refundStatuses = ['pending', 'requires_action', 'succeeded', 'failed', 'canceled'] as const

function toRefund(refund: Stripe.Refund): Refund {
  return { id: refund.id, status: refundStatuses.find((known) => known === refund.status) ?? 'pending', amountMinor: refund.amount, paymentIntentId: idOf(refund.payment_intent) }
}

function idOf(link: string | { id: string } | null): string | null {
  return typeof link === 'string' ? link : (link?.id ?? null)
}

async function asPaymentError<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call()
  } catch (error) {
    if (!(error instanceof Stripe.errors.StripeError)) throw error
    throw new PaymentError(reasonOf(error), `payment service: ${error.message}`, { cause: error })
  }
}

function reasonOf(error: InstanceType<typeof Stripe.errors.StripeError>): PaymentError['reason'] {
  if (error.statusCode === 404 || error.code === 'resource_missing') return 'not-found'
  // 401 and 403 are our own settings, 409 and 429 are worth another try: none of them is an answer about the payment.
  const refused = [400, 402].includes(error.statusCode ?? 0)
  return refused ? 'not-acceptable' : 'unavailable'
}
