import Stripe from 'stripe'
import { onTestFinished } from 'vitest'
import { startFakeStripe, type FakeStripeOptions } from '../../../fakes/stripe/create-fake-stripe.ts'
import { startNoticeReceiver } from '../start-notice-receiver.ts'

export const secretKey = 'sk_test_crosshead'
export const webhookSecret = 'whsec_crosshead'

/** A stand-in with a receiver of its notices, and Stripe's own SDK to talk to it; all ended with the test. */
export async function openFakeStripe(options: Partial<FakeStripeOptions> & { answers?: number[] } = {}) {
  const { answers, ...rest } = options
  const receiver = await startNoticeReceiver(answers)
  const fake = await startFakeStripe({ webhookUrl: receiver.url, secretKey, webhookSecret, ...rest })
  onTestFinished(async () => {
    await fake.stop()
    await receiver.stop()
  })
  return { fake, receiver, stripe: sdk(fake.port) }
}

export function sdk(port: number, config: { maxNetworkRetries?: number; timeout?: number; key?: string } = {}): Stripe {
  return new Stripe(config.key ?? secretKey, { host: '127.0.0.1', port, protocol: 'http', maxNetworkRetries: config.maxNetworkRetries ?? 0, timeout: config.timeout ?? 5000, telemetry: false })
}

export function newCheckout(change: Partial<Stripe.Checkout.SessionCreateParams> = {}): Stripe.Checkout.SessionCreateParams {
  return {
    mode: 'payment',
    client_reference_id: 'J-26-00417',
    customer_email: 'buyer@brackwater.example',
    line_items: [
      { quantity: 3, price_data: { currency: 'eur', unit_amount: 8500, product_data: { name: 'Vickers hardness <HV 10>' } } },
      { quantity: 1, price_data: { currency: 'eur', unit_amount: 12050, product_data: { name: 'Tensile test' } } },
    ],
    success_url: 'http://127.0.0.1:9/paid?checkout={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://127.0.0.1:9/left',
    ...change,
  }
}
