import { json, Router, urlencoded, type NextFunction, type Request, type Response } from 'express'
import * as z from 'zod'
import { Fault } from '../api/faults.ts'
import { StripeFailure } from '../api/stripe-failure.ts'
import type { StripeControl } from '../create-control.ts'
import { forgeries, webhookModes } from '../webhooks/create-webhooks.ts'
import { sendControlPage } from './send-control-page.ts'

const YesNo = z.union([z.boolean(), z.enum(['true', 'false']).transform((value) => value === 'true')])
const Mode = z.strictObject({ mode: z.enum(webhookModes) })
const Release = z.strictObject({ reversed: YesNo.optional(), times: z.coerce.number().int().min(1).max(10).optional() })
const Resend = z.strictObject({ eventId: z.string() })
const Forge = z.strictObject({ checkoutId: z.string(), how: z.enum(forgeries) })
const Receiver = z.strictObject({ url: z.url({ protocol: /^https?$/ }) })
const CheckoutAction = z.strictObject({ checkoutId: z.string(), action: z.enum(['pay', 'decline', 'expire']) })

/** `/control` for people, `/control.json` and POST `/control/…` for people and tests: JSON is answered by JSON, a form by the page. */
export function controlRoutes(control: StripeControl): Router {
  const router = Router()
  router.use('/control', json({ limit: '10kb' }), urlencoded({ extended: false, limit: '10kb' }))

  const command = <S extends z.ZodType>(path: string, schema: S, run: (input: z.infer<S>) => unknown) => {
    router.post(`/control/${path}`, async (req, res) => {
      const input = schema.safeParse(req.body ?? {})
      if (!input.success) return void res.status(400).json({ error: z.prettifyError(input.error) })
      const result = await run(input.data)
      if (req.is('json')) res.json({ ok: true, result: result ?? null })
      else res.redirect(303, '/control')
    })
  }
  command('webhooks', Mode, ({ mode }) => control.setWebhookMode(mode))
  command('webhook-url', Receiver, ({ url }) => control.setWebhookUrl(url))
  command('release', Release, (input) => control.release(input))
  command('resend', Resend, ({ eventId }) => control.resend(eventId))
  command('forge', Forge, ({ checkoutId, how }) => control.forge(checkoutId, how))
  command('fail-next', Fault, (fault) => control.failNext(fault))
  command('clear-faults', z.strictObject({}), () => control.clearFaults())
  command('checkout', CheckoutAction, ({ checkoutId, action }) => control[action](checkoutId))

  router.get('/control', (_req, res) => sendControlPage(res, control))
  router.get('/control.json', (_req, res) => {
    res.json({
      webhookMode: control.webhookMode(),
      plannedFaults: control.plannedFaults(),
      checkouts: control.checkouts(),
      payments: control.payments(),
      refunds: control.refunds(),
      events: control.events(),
    })
  })
  router.use('/control', (error: unknown, _req: Request, res: Response, next: NextFunction) => {
    if (!(error instanceof StripeFailure)) return next(error)
    res.status(error.status).json({ error: error.message })
  })
  return router
}
