import type { RequestHandler } from 'express'
import session from 'express-session'
import type { PassportStatic } from 'passport'
import { handlerOf } from './passport.ts'
import { sessionCookie } from './session-cookie.ts'
import type { SessionStore } from './session-store.ts'
import { absoluteMs } from './session-times.ts'

/** Sessions by cookie, kept from sign-in on only, and the caller of each request from them. */
export function keepSessions({ store, passport, secret }: { store: SessionStore; passport: PassportStatic; secret: string }): RequestHandler[] {
  const { name, options } = sessionCookie()
  return [
    session({ store, secret, name, cookie: options, resave: false, saveUninitialized: false }),
    (req, _res, next) => {
      // The store leaves out what has ended; a clock that was set back must not lengthen the absolute end.
      const { startedAt } = req.session
      if (startedAt !== undefined && Date.now() - startedAt >= absoluteMs) return req.session.regenerate(next)
      next()
    },
    handlerOf(passport.session()),
  ]
}
