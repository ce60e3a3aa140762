import type { RequestHandler } from 'express'
import { v7 } from 'uuid'

/** Gives each request an id of our own making; it stands in the log, in the ledger and in every refusal. */
export const requestId: RequestHandler = (req, res, next) => {
  req.requestId = v7()
  req.caller = null
  res.set('X-Request-Id', req.requestId)
  next()
}
