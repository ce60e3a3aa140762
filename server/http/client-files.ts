import { join } from 'node:path'
import type { Express } from 'express'
import pressed from 'express-static-gzip'
import { Problem } from '../../shared/problems.ts'

/** The build has pressed the files with Brotli; a browser that does not take that gets them plain. */
const asPressed = { enableBrotli: true, orderPreference: ['br'], index: false }

/** The built browser part: files with a hash in their name never change, the page itself is asked for anew each time. */
export function serveClient(app: Express, folder: string): void {
  const assets = join(folder, 'assets')
  app.use('/assets', pressed(assets, { ...asPressed, serveStatic: { immutable: true, maxAge: '365d', redirect: false } }), (_req, _res, next) => next(new Problem('not-found', 'there is no such file')))
  app.use(pressed(folder, { ...asPressed, serveStatic: { redirect: false, setHeaders: (res) => void res.setHeader('Cache-Control', 'no-cache') } }))
  app.get('/{*splat}', (_req, res, next) => {
    res.sendFile('index.html', { root: folder, headers: { 'Cache-Control': 'no-cache' }, cacheControl: false }, (error: unknown) => {
      if (error && !res.headersSent) next(new Problem('not-found', 'the pages are not built; run npm run build'))
    })
  })
}
