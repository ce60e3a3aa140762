import type { Request, RequestHandler, Response } from 'express'
import passport from 'passport'
import { Strategy } from 'passport-local'
import { Problem } from '../../../shared/problems.ts'
import { readCaller } from './read-caller.ts'

/** Checks an e-mail address and password; gives the person's id, or refuses by throwing. */
type CheckPassword = (email: string, password: string, req: Request) => Promise<{ id: string; epoch: number }>

/** Teaches Passport how people sign in and how a session becomes the caller of a request. */
export function preparePassport(checkPassword: CheckPassword): typeof passport {
  passport.use(new Strategy({ usernameField: 'email', passwordField: 'password', passReqToCallback: true }, (req, email, password, done) => {
    checkPassword(email, password, req).then((user) => done(null, user), (error: unknown) => done(error))
  }))
  passport.serializeUser((user, done) => done(null, user.id))
  passport.deserializeUser((req: Request, id: string, done: (error: unknown, user?: Express.User | false) => void) => {
    readCaller(id, req.session.epoch, req.requestId).then((caller) => {
      req.caller = caller
      done(null, caller ? { id, epoch: req.session.epoch ?? 0 } : false)
    }, (error: unknown) => done(error))
  })
  return passport
}

/** Runs the sign-in strategy on a request; gives who it is, or throws the refusal. */
export function authenticate(req: Request, res: Response): Promise<Express.User> {
  return new Promise((resolve, reject) => {
    const answer = (error: unknown, user?: Express.User | false) => {
      if (user) resolve(user)
      else reject(error instanceof Error ? error : new Problem('wrong-sign-in', 'give an e-mail address and a password'))
    }
    void handlerOf(passport.authenticate('local', { session: false }, answer))(req, res, answer)
  })
}

/** Passport's types say nothing of what its middleware is. */
export function handlerOf(middleware: unknown): RequestHandler {
  if (!isHandler(middleware)) throw new TypeError('Passport gave no middleware')
  return middleware
}

const isHandler = (value: unknown): value is RequestHandler => typeof value === 'function'
