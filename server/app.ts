import { resolve } from 'node:path'
import express, { Router, type Express } from 'express'
import { Problem } from '../shared/problems.ts'
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
import { benchRoutes } from './routes/benches.ts'
import { changeRoutes } from './routes/changes.ts'
import { evaluationRoutes } from './routes/evaluations.ts'
import { fileRoutes } from './routes/files.ts'
import { jobRoutes } from './routes/jobs.ts'
import { paymentNoticeRoute, paymentRoutes } from './routes/payments.ts'
import { peopleRoutes } from './routes/people.ts'
import { reportRoutes } from './routes/reports.ts'
import { sampleRoutes } from './routes/samples.ts'
import { checkPassword, sessionRoutes } from './routes/sessions.ts'
import { testRunRoutes } from './routes/test-runs.ts'

/** A process that stops ends the streams first, lets other requests finish, then closes what the app keeps open. */
export type App = Express & { endStreams(): void; close(): Promise<void> }

const operations = [sessionRoutes, peopleRoutes, evaluationRoutes, jobRoutes, paymentRoutes, sampleRoutes, benchRoutes, testRunRoutes, reportRoutes, fileRoutes]

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
  // Notices of payments have no session and no page of ours: what counts is the signature over the body as it came.
  api.use('/payments/notices', express.raw({ type: () => true, limit: '1mb' }))
  paymentNoticeRoute(api)
  api.use(keepSessions({ store, passport: preparePassport(checkPassword), secret: settings.SESSION_SECRET }))
  api.use(ownPagesOnly(settings.BASE_URL), holdBackPerson, readJson)
  api.use(['/links', '/report-checks'], holdBackAddress('codes'))
  for (const bind of operations) bind(api)
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
