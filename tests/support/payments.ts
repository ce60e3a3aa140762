import { afterAll } from 'vitest'
import { startFakeStripe, type FakeStripe } from '../../fakes/stripe/create-fake-stripe.ts'
import { startTestApp, type TestApp } from './app.ts'

/** The app with the stand-in for the payment service, whose notices reach it. Notices are kept back until a test says how they come. */
export async function startTestPayments(): Promise<{ app: TestApp; stripe: FakeStripe }> {
  const stripe = await startFakeStripe({
    webhookUrl: 'http://127.0.0.1:9', secretKey: process.env.STRIPE_SECRET_KEY ?? '', webhookSecret: process.env.STRIPE_WEBHOOK_SECRET ?? '', retryDelaysMs: [],
  })
  const app = await startTestApp({ STRIPE_API_BASE: stripe.url })
  stripe.control.setWebhookUrl(`${app.address}/api/payments/notices`)
  stripe.control.setWebhookMode('drop')
  afterAll(() => stripe.stop())
  return { app, stripe }
}
