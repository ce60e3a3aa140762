import express, { type Express } from 'express'
import { pageStyle } from './page-style.ts'

/** An app with what every stand-in's pages share: safe headers, the style sheet, `/healthz`, and no commands from other sites. */
export function createPageApp(): Express {
  const app = express()
  app.disable('x-powered-by')
  app.set('query parser', 'extended')
  app.use((req, res, next) => {
    res.set({ 'x-content-type-options': 'nosniff', 'referrer-policy': 'no-referrer', 'content-security-policy': "default-src 'none'; frame-ancestors 'none'" })
    if (req.method !== 'GET' && req.get('sec-fetch-site') === 'cross-site') {
      res.status(403).json({ error: 'a page of another site may not do this' })
      return
    }
    next()
  })
  app.get('/healthz', (_req, res) => {
    res.json({ ok: true })
  })
  app.get('/page.css', (_req, res) => {
    res.type('css').send(pageStyle)
  })
  return app
}
