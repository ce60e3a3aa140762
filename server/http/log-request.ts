import type { RequestHandler } from 'express'
import { addressOf } from './address-of.ts'
import { log } from './log.ts'

/** One line per answered API request. It names the pattern of the path, not the path: that may hold a link's token. */
export const logRequest: RequestHandler = (req, res, next) => {
  const start = performance.now()
  const address = addressOf(req)
  res.once('close', () => {
    const route: unknown = req.route
    const pattern = typeof route === 'object' && route !== null && 'path' in route ? String(route.path) : '(none)'
    log.info({ requestId: req.requestId, method: req.method, path: `${req.baseUrl}${pattern}`, status: res.statusCode, ms: Math.round(performance.now() - start), person: req.caller?.person.id, address })
  })
  next()
}
