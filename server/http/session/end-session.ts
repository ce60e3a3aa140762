import type { Request, Response } from 'express'
import { sessionCookie } from './session-cookie.ts'

/** Ends the browser's session, in the database and in its cookie. */
export async function endSession(req: Request, res: Response): Promise<void> {
  await new Promise<void>((resolve, reject) => req.session.destroy((error: unknown) => (error ? reject(error instanceof Error ? error : new Error(String(error))) : resolve())))
  req.caller = null
  const { name, options } = sessionCookie()
  res.clearCookie(name, options)
}
