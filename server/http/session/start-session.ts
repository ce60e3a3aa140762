import type { Request } from 'express'
import { asPromise } from './as-promise.ts'

/** Signs a person in on a session with a new id; whatever the browser had before is ended. */
export async function startSession(req: Request, user: Express.User, sharedScreen = false): Promise<void> {
  await asPromise((done) => req.logIn(user, done))
  Object.assign(req.session, { startedAt: Date.now(), epoch: user.epoch, sharedScreen })
  await asPromise((done) => req.session.save(done))
}
