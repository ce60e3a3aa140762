import type { Request } from 'express'

/** Signs a person in on a session with a new id; whatever the browser had before is ended. */
export async function startSession(req: Request, user: Express.User, sharedScreen = false): Promise<void> {
  await new Promise<void>((resolve, reject) => req.logIn(user, (error: unknown) => (error ? reject(asError(error)) : resolve())))
  Object.assign(req.session, { startedAt: Date.now(), epoch: user.epoch, sharedScreen })
  await new Promise<void>((resolve, reject) => req.session.save((error: unknown) => (error ? reject(asError(error)) : resolve())))
}

const asError = (error: unknown): Error => (error instanceof Error ? error : new Error(String(error)))
