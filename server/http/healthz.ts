import type { RequestHandler } from 'express'
import { database } from '../database/connection.ts'

const patienceMs = 2000

/** Well means that the database answers; the queue may be away for a while without anybody losing anything. */
export const healthz: RequestHandler = async (_req, res) => {
  let timer: NodeJS.Timeout | undefined
  const late = new Promise<false>((resolve) => { timer = setTimeout(resolve, patienceMs, false) })
  const isWell = await Promise.race([database.query('select 1').then(() => true, () => false), late])
  clearTimeout(timer)
  res.status(isWell ? 200 : 503).set('Cache-Control', 'no-store').type('text/plain').send(isWell ? 'well' : 'the database does not answer')
}
