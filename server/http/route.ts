import type { Request, Response, Router } from 'express'
import type * as z from 'zod'
import type { Endpoint } from '../../shared/api/endpoint.ts'
import { Problem } from '../../shared/problems.ts'
import type { Caller } from '../caller.ts'

type Input<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType> = { params: z.infer<P>; query: z.infer<Q>; body: z.infer<B> }
type Handler<I, C, R> = (input: I, caller: C, at: { req: Request; res: Response }) => Promise<R>

/**
 * Binds an endpoint to its use case: signed in, allowed at all, input checked, answer passed through its schema. An
 * endpoint for anyone gets the caller if there is one. Files and streams write to `res` themselves.
 */
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  router: Router, e: Endpoint<P, Q, B, R> & { can: 'anyone' }, handler: Handler<Input<P, Q, B>, Caller | null, z.input<R>>): void
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  router: Router, e: Endpoint<P, Q, B, R>, handler: Handler<Input<P, Q, B>, Caller, z.input<R>>): void
export function route<P extends z.ZodType, Q extends z.ZodType, B extends z.ZodType, R extends z.ZodType>(
  router: Router, e: Endpoint<P, Q, B, R>, handler: Handler<Input<P, Q, B>, Caller, z.input<R>>): void {
  router[e.method](e.path, async (req: Request, res: Response) => {
    const { caller } = req
    if (e.can !== 'anyone') {
      if (!caller) throw new Problem('not-signed-in', 'sign in first')
      if (e.can !== 'signed-in' && !caller.ability.can(e.can[0], e.can[1])) throw new Problem('not-allowed', `you may not ${e.can[0]} this`)
    }
    const input = { params: e.params.parse(req.params), query: e.query.parse(req.query), body: e.takes === 'file' ? ({} as z.infer<B>) : e.body.parse(req.body ?? {}) }
    const answer = await handler(input, caller as Caller, { req, res })
    if (e.answers === 'json') res.json(e.response.parse(answer))
  })
}
