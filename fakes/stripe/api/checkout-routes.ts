import { Router } from 'express'
import * as z from 'zod'
import { checkoutSession, lineItem } from '../wire/checkout-session.ts'
import { paymentIntent } from '../wire/payment-intent.ts'
import type { CheckoutRecord } from '../stripe-state.ts'
import type { ApiContext } from './api-context.ts'
import { CheckoutForm, createCheckout } from './create-checkout.ts'
import { found } from './found.ts'
import { listPage, pageQuery } from './list-page.ts'
import { parseForm } from './parse-form.ts'
import { StripeFailure } from './stripe-failure.ts'

const Expand = z.strictObject({ expand: z.array(z.string()).optional() })
const ListQuery = z.strictObject({
  ...pageQuery,
  payment_intent: z.string().optional(),
  status: z.enum(['open', 'complete', 'expired']).optional(),
  expand: z.array(z.string()).optional(),
})

/** `/v1/checkout/sessions` */
export function checkoutRoutes({ state, payments, payUrl }: ApiContext): Router {
  const router = Router()
  const one = (id: string) => found(state.checkouts, id, 'checkout.session', 'session')
  const lines = (checkout: CheckoutRecord) => ({
    object: 'list',
    url: `/v1/checkout/sessions/${checkout.id}/line_items`,
    has_more: false,
    data: checkout.lines.map((line) => lineItem(line, checkout.currency)),
  })
  const write = (checkout: CheckoutRecord, expand: string[] = []) => {
    const payment = checkout.paymentId ? state.payments[checkout.paymentId] : undefined
    const unknown = expand.find((path) => path !== 'line_items' && path !== 'payment_intent')
    if (unknown) throw new StripeFailure(400, { type: 'invalid_request_error', param: 'expand', message: `This property cannot be expanded (${unknown}).` })
    return {
      ...checkoutSession(checkout, payUrl(checkout.id)),
      ...(expand.includes('line_items') && { line_items: lines(checkout) }),
      ...(expand.includes('payment_intent') && payment && { payment_intent: paymentIntent(payment) }),
    }
  }

  router.post('/', (req, res) => {
    const form = parseForm(CheckoutForm, req.body)
    const checkout = createCheckout(form)
    const answer = write(checkout, form.expand)
    state.checkouts[checkout.id] = checkout
    res.json(answer)
  })
  router.get('/', (req, res) => {
    const query = parseForm(ListQuery, req.query)
    const keep = (checkout: CheckoutRecord) =>
      (!query.payment_intent || checkout.paymentId === query.payment_intent) && (!query.status || checkout.status === query.status)
    const expand = query.expand?.map((path) => path.replace(/^data\./, ''))
    res.json(listPage(state.checkouts, query, '/v1/checkout/sessions', keep, (checkout) => write(checkout, expand)))
  })
  router.get('/:id', (req, res) => {
    res.json(write(one(req.params.id), parseForm(Expand, req.query).expand))
  })
  router.get('/:id/line_items', (req, res) => {
    parseForm(z.strictObject(pageQuery), req.query)
    res.json(lines(one(req.params.id)))
  })
  router.post('/:id/expire', (req, res) => {
    const { expand } = parseForm(Expand, req.body)
    const checkout = one(req.params.id)
    payments.expire(checkout)
    res.json(write(checkout, expand))
  })
  return router
}
