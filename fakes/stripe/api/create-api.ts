import { timingSafeEqual, createHash } from 'node:crypto'
import { Router, urlencoded, type NextFunction, type Request, type Response } from 'express'
import { newId } from '../new-id.ts'
import type { ApiContext } from './api-context.ts'
import { checkoutRoutes } from './checkout-routes.ts'
import { eventRoutes } from './event-routes.ts'
import type { Faults } from './faults.ts'
import { keepOnce } from './keep-once.ts'
import { paymentRoutes } from './payment-routes.ts'
import { StripeFailure } from './stripe-failure.ts'

export type ApiOptions = ApiContext & {
  secretKey: string
  faults: Faults
  save: () => void
}

/** Stripe's `/v1` as far as Checkout, payments, refunds and events go. */
export function createApi({ secretKey, faults, save, ...context }: ApiOptions): Router {
  const api = Router()
  api.use((req, res, next) => {
    res.set('request-id', newId('req', 14))
    const version = req.get('stripe-version')
    if (version) res.set('stripe-version', version)
    checkKey(req, secretKey)
    next()
  })
  api.use(urlencoded({ extended: true, limit: '1mb', parameterLimit: 5000 }))
  api.use((req, res, next) => strike(faults, req, res, next))
  api.use(keepOnce(context.state, save))
  api.use((_req, _res, next) => {
    if (context.payments.expireOverdue()) save()
    next()
  })
  api.use('/checkout/sessions', checkoutRoutes(context))
  api.use('/events', eventRoutes(context))
  api.use('/', paymentRoutes(context))
  api.use((req) => {
    throw new StripeFailure(404, { type: 'invalid_request_error', message: `Unrecognized request URL (${req.method}: ${req.originalUrl}).` })
  })
  api.use(answerFailure)
  return api
}

function checkKey(req: Request, secretKey: string): void {
  const [scheme, value] = (req.get('authorization') ?? '').split(' ')
  const given = scheme === 'Basic' ? (Buffer.from(value ?? '', 'base64').toString().split(':')[0] ?? '') : scheme === 'Bearer' ? (value ?? '') : ''
  if (given === '') throw new StripeFailure(401, { type: 'invalid_request_error', message: 'You did not provide an API key.' })
  const digest = (text: string) => createHash('sha256').update(text).digest()
  if (!timingSafeEqual(digest(given), digest(secretKey))) {
    throw new StripeFailure(401, { type: 'invalid_request_error', message: `Invalid API Key provided: ${given.slice(0, 7)}****` })
  }
}

/** Lets a planned fault hit this call. */
function strike(faults: Faults, req: Request, res: Response, next: NextFunction): void {
  const how = faults.take(req.originalUrl)
  if (how === 'rate-limit') throw new StripeFailure(429, { type: 'invalid_request_error', code: 'rate_limit', message: 'Too many requests hit the API too quickly.' })
  if (how === 'server-error') throw new StripeFailure(500, { type: 'api_error', message: 'An unknown error occurred.' })
  if (how === 'timeout' || how === 'cut') {
    // The work goes on as usual; only its answer is lost.
    res.json = () => {
      if (how === 'cut') req.socket.destroy()
      return res
    }
  }
  next()
}

function answerFailure(error: unknown, _req: Request, res: Response, next: NextFunction): void {
  if (res.headersSent) return next(error)
  const failure = error instanceof StripeFailure ? error : unreadable(error)
  res.status(failure.status).json({ error: failure.body })
}

function unreadable(error: unknown): StripeFailure {
  const message = error instanceof Error ? error.message : String(error)
  const fromBody = error instanceof Error && 'status' in error && error.status !== 500
  return new StripeFailure(fromBody ? 400 : 500, { type: fromBody ? 'invalid_request_error' : 'api_error', message })
}
