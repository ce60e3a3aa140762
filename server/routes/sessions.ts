import type { Request, Router } from 'express'
import * as sessions from '../../shared/api/sessions.ts'
import { addressOf } from '../http/address-of.ts'
import { route } from '../http/route.ts'
import { endSession } from '../http/session/end-session.ts'
import { authenticate } from '../http/session/passport.ts'
import { startSession } from '../http/session/start-session.ts'
import { askPasswordReset } from '../services/people/links/ask-password-reset.ts'
import { readLink } from '../services/people/links/read-link.ts'
import { useLink } from '../services/people/links/use-link.ts'
import { changePassword } from '../services/people/session/change-password.ts'
import { readSession } from '../services/people/session/read-session.ts'
import { signIn } from '../services/people/session/sign-in.ts'
import { signOut } from '../services/people/session/sign-out.ts'

/** What Passport's strategy asks; it gives the body as it was sent, so the schema's changes are made here again. */
export function checkPassword(email: string, password: string, req: Request): Promise<Express.User> {
  return signIn({ email: sessions.SignIn.shape.email.parse(email), password, address: addressOf(req), requestId: req.requestId })
}

export function sessionRoutes(router: Router): void {
  route(router, sessions.readSession, (_input, caller) => readSession(caller?.person.id ?? null))
  route(router, sessions.signIn, async ({ body }, _caller, { req, res }) => {
    const user = await authenticate(req, res)
    await startSession(req, user, body.sharedScreen)
    return readSession(user.id)
  })
  route(router, sessions.signOut, async (_input, caller, { req, res }) => {
    if (caller) await signOut(caller)
    await endSession(req, res)
    return readSession(null)
  })
  route(router, sessions.changePassword, async ({ body }, caller, { req }) => {
    const user = await changePassword(body, addressOf(req), caller)
    await startSession(req, user, req.session.sharedScreen)
    return readSession(user.id)
  })
  route(router, sessions.askPasswordReset, ({ body }, _caller, { req }) => askPasswordReset(body.email, { address: addressOf(req), requestId: req.requestId }))
  route(router, sessions.readLink, ({ params }) => readLink(params.token))
  route(router, sessions.useLink, async ({ params, body }, _caller, { req }) => {
    const user = await useLink(params.token, body.password, req.requestId)
    await startSession(req, user)
    return readSession(user.id)
  })
}
