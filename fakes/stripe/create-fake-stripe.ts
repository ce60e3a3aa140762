import { createPageApp } from '../page/create-page-app.ts'
import { listenLocal } from '../page/listen-local.ts'
import { createApi } from './api/create-api.ts'
import { createFaults } from './api/faults.ts'
import { createControl, type StripeControl } from './create-control.ts'
import { openState } from './open-state.ts'
import { controlRoutes } from './pages/control-routes.ts'
import { payRoutes } from './pages/pay-routes.ts'
import { createPayments } from './payments/payments.ts'
import { createWebhooks } from './webhooks/create-webhooks.ts'

export type FakeStripeOptions = {
  /** A free one when left out. */
  port?: number
  webhookUrl: string
  secretKey: string
  webhookSecret: string
  /** Without it a restart forgets. */
  stateFile?: string
  /** The address people reach it by, where that is not the loopback address. */
  publicUrl?: string
  retryDelaysMs?: number[]
}

export type FakeStripe = {
  url: string
  port: number
  control: StripeControl
  stop: () => Promise<void>
}

const apiVersion = '2026-10-28.endive'
const seconds = 1000
const retryDelaysMs = [1, 5, 30, 120, 600, 3600, 3 * 3600].map((delay) => delay * seconds)

/** Starts the stand-in for the payment service: Stripe's wire format, a payment page, signed webhooks, and a way to make all of it misbehave. */
export async function startFakeStripe(options: FakeStripeOptions): Promise<FakeStripe> {
  const { state, save } = openState(options.stateFile)
  const faults = createFaults()
  const webhooks = createWebhooks({
    state,
    save,
    url: options.webhookUrl,
    secret: options.webhookSecret,
    apiVersion,
    retryDelaysMs: options.retryDelaysMs ?? retryDelaysMs,
  })
  // Known once it listens; no checkout can be made earlier.
  let address = options.publicUrl ?? ''
  const payUrl = (checkoutId: string) => `${address}/pay/${checkoutId}`
  const payments = createPayments({ state, payUrl, announce: webhooks.announce })
  const control = createControl({ state, payments, payUrl, webhooks, faults, save })

  const app = createPageApp()
  app.use('/v1', createApi({ state, payments, payUrl, secretKey: options.secretKey, faults, save }))
  app.use('/pay', payRoutes({ state, payments, payUrl, save }))
  app.use(controlRoutes(control))
  app.get('/', (_req, res) => res.redirect('/control'))

  const { port, close } = await listenLocal(app, options.port ?? 0)
  const url = `http://127.0.0.1:${port}`
  address ||= url
  const clock = setInterval(() => {
    if (payments.expireOverdue()) save()
  }, 5 * seconds).unref()

  return {
    url,
    port,
    control,
    async stop() {
      clearInterval(clock)
      await close()
      await webhooks.stop()
    },
  }
}
