import type { Request, Response } from 'express'
import { asPromise } from './as-promise.ts'
import { sessionCookie } from './session-cookie.ts'

/** Ends the browser's session, in the database and in its cookie. */
export async function endSession(req: Request, res: Response): Promise<void> {
  await asPromise((done) => req.session.destroy(done))
  req.caller = null
  const { name, options } = sessionCookie()
  res.clearCookie(name, options)
}
