import { Router } from 'express'
import * as z from 'zod'
import { charge } from '../wire/charge.ts'
import { paymentIntent } from '../wire/payment-intent.ts'
import { refund } from '../wire/refund.ts'
import type { PaymentRecord, RefundRecord } from '../stripe-state.ts'
import type { ApiContext } from './api-context.ts'
import { found } from './found.ts'
import { listPage, pageQuery } from './list-page.ts'
import { parseForm } from './parse-form.ts'
import { StripeFailure } from './stripe-failure.ts'

const RefundForm = z
  .strictObject({
    payment_intent: z.string().optional(),
    charge: z.string().optional(),
    amount: z.string().regex(/^[1-9]\d{0,11}$/, 'Invalid positive integer').transform(Number).optional(),
    reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
    metadata: z.record(z.string().max(40), z.string().max(500)).optional(),
  })
const RefundQuery = z.strictObject({ ...pageQuery, payment_intent: z.string().optional(), charge: z.string().optional() })
const IntentQuery = z.strictObject({ expand: z.array(z.literal('latest_charge', 'This property cannot be expanded.')).optional() })

/** `/v1/payment_intents`, `/v1/charges` and `/v1/refunds` */
export function paymentRoutes({ state, payments }: ApiContext): Router {
  const router = Router()
  const byCharge = (chargeId: string, status: number): PaymentRecord =>
    Object.values(state.payments).find((payment) => payment.chargeId === chargeId) ?? found({}, chargeId, 'charge', 'charge', status)
  const writeRefund = (record: RefundRecord) => refund(record, found(state.payments, record.paymentId, 'payment_intent'))
  const writeIntent = (payment: PaymentRecord, expand: string[] = []) => ({
    ...paymentIntent(payment),
    ...(expand.includes('latest_charge') && { latest_charge: charge(payment) }),
  })

  router.get('/payment_intents', (req, res) => {
    const query = parseForm(z.strictObject(pageQuery), req.query)
    res.json(listPage(state.payments, query, '/v1/payment_intents', () => true, (payment) => writeIntent(payment)))
  })
  router.get('/payment_intents/:id', (req, res) => {
    const { expand } = parseForm(IntentQuery, req.query)
    res.json(writeIntent(found(state.payments, req.params.id, 'payment_intent', 'intent'), expand))
  })
  router.get('/charges/:id', (req, res) => {
    res.json(charge(byCharge(req.params.id, 404)))
  })
  router.post('/refunds', (req, res) => {
    const form = parseForm(RefundForm, req.body)
    const paymentId = form.payment_intent ?? (form.charge && byCharge(form.charge, 400).id)
    if (!paymentId) throw new StripeFailure(400, { type: 'invalid_request_error', message: 'One of the following params should be provided for this request: payment_intent or charge.' })
    res.json(writeRefund(payments.refund({ paymentId, amount: form.amount, reason: form.reason ?? null, metadata: form.metadata ?? {} })))
  })
  router.get('/refunds', (req, res) => {
    const query = parseForm(RefundQuery, req.query)
    const paymentId = query.payment_intent ?? (query.charge && byCharge(query.charge, 400).id)
    res.json(listPage(state.refunds, query, '/v1/refunds', (record) => !paymentId || record.paymentId === paymentId, writeRefund))
  })
  router.get('/refunds/:id', (req, res) => {
    res.json(writeRefund(found(state.refunds, req.params.id, 'refund', 'id')))
  })
  return router
}
