import type { RequestHandler } from 'express'
import { Problem } from '../../shared/problems.ts'

const reading = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Changes come only from the product's own pages. Browsers say where a request comes from in `Sec-Fetch-Site`, older ones
 * in `Origin`; a program that is no browser has to send one of them too.
 */
export function ownPagesOnly(baseUrl: string): RequestHandler {
  const ownOrigin = new URL(baseUrl).origin
  return (req, _res, next) => {
    if (reading.has(req.method)) return next()
    const site = req.get('Sec-Fetch-Site')
    if (site !== undefined ? site === 'same-origin' || site === 'none' : isOwn(req.get('Origin'), req.get('Host'))) return next()
    next(new Problem('not-allowed', 'this request does not come from the product\'s own pages'))
  }

  function isOwn(origin: string | undefined, host: string | undefined): boolean {
    if (origin === undefined || !URL.canParse(origin)) return false
    return origin === ownOrigin || (host !== undefined && new URL(origin).host === host)
  }
}
