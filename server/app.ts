import { resolve } from 'node:path'
import express, { Router, type Express } from 'express'
import { Problem } from '../shared/problems.ts'
import { changeRoutes } from './routes/changes.ts'
import { peopleRoutes } from './routes/people.ts'
import { checkPassword, sessionRoutes } from './routes/sessions.ts'
import { ChangesHub } from './http/changes-hub.ts'
import { serveClient } from './http/client-files.ts'
import { healthz } from './http/healthz.ts'
import { holdBackAddress, holdBackPerson } from './http/limits/hold-back.ts'
import { logRequest } from './http/log-request.ts'
import { ownPagesOnly } from './http/own-pages-only.ts'
import { answerProblem } from './http/problem.ts'
import { readJson } from './http/read-json.ts'
import { requestId } from './http/request-id.ts'
import { securityHeaders } from './http/security-headers.ts'
import { keepSessions } from './http/session/keep-sessions.ts'
import { preparePassport } from './http/session/passport.ts'
import { SessionStore } from './http/session/session-store.ts'
import { outside } from './integrations/outside.ts'

/** A process that stops ends the streams first, lets other requests finish, then closes what the app keeps open. */
export type App = Express & { endStreams(): void; close(): Promise<void> }

/** The whole HTTP side of the product. Needs `setOutside` before. */
export function createApp(): App {
  const { settings } = outside()
  const store = new SessionStore(settings.DATABASE_URL)
  const hub = new ChangesHub(settings.REDIS_URL, process.env.QUEUE_PREFIX ?? 'crosshead')

  const app = express()
  app.disable('x-powered-by')
  // Only a proxy on this machine is believed about who asks and whether they came by https (X-Forwarded-For, -Proto).
  app.set('trust proxy', 'loopback')
  app.use(requestId)
  app.use(securityHeaders(settings.BASE_URL.startsWith('https:')))
  app.get('/healthz', healthz)

  const api = Router()
  api.use(logRequest, holdBackAddress('requests'), (_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  // Notices of payments carry no session and are checked by their signature over the raw body, so they come before both.
  api.use('/payments/notices', express.raw({ type: () => true, limit: '1mb' }))
  api.use(keepSessions({ store, passport: preparePassport(checkPassword), secret: settings.SESSION_SECRET }))
  api.use(ownPagesOnly(settings.BASE_URL), holdBackPerson, readJson)
  api.use(['/links', '/report-checks'], holdBackAddress('codes'))
  sessionRoutes(api)
  peopleRoutes(api)
  changeRoutes(api, hub)
  api.use((_req, _res, next) => next(new Problem('not-found', 'there is no such address')))
  app.use('/api', api)

  serveClient(app, resolve('.build/client'))
  app.use(answerProblem)
  return Object.assign(app, {
    endStreams: () => hub.close(),
    close: () => store.end(),
  })
}
