import type { RequestHandler } from 'express'
import type { StripeState } from '../stripe-state.ts'
import { StripeFailure } from './stripe-failure.ts'

/**
 * Idempotency keys, and saving: the first successful answer to a key is kept with its request and given again to a repeat; the same key for
 * another request is refused. The state is saved before the answer leaves, so an answer that was seen survives a crash.
 */
export function keepOnce(state: StripeState, save: () => void): RequestHandler {
  return (req, res, next) => {
    if (req.method !== 'POST') return next()
    const key = req.get('idempotency-key')
    const request = `${req.method} ${req.originalUrl} ${JSON.stringify(req.body ?? {})}`
    const kept = key === undefined || !Object.hasOwn(state.idempotency, key) ? undefined : state.idempotency[key]
    if (kept && kept.request !== request) {
      const message = `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`
      throw new StripeFailure(400, { type: 'idempotency_error', message })
    }
    if (key !== undefined) res.set('idempotency-key', key)
    if (kept) {
      res.status(kept.status).set('idempotent-replayed', 'true').json(JSON.parse(kept.body))
      return
    }
    const answer = res.json.bind(res)
    res.json = (body: unknown) => {
      if (key !== undefined && res.statusCode < 400) {
        state.idempotency[key] = { request, created: Math.floor(Date.now() / 1000), status: res.statusCode, body: JSON.stringify(body) }
      }
      save()
      return answer(body)
    }
    next()
  }
}
