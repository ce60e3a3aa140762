import * as z from 'zod'
import type { Action, SubjectName } from './permission.ts'

/**
 * What one operation is: the server binds it, the client calls it, and tests visit all of them.
 * `answers` says what comes back: JSON by the schema, a file, or a stream of changes. `takes` is 'file' for uploads,
 * whose other fields travel beside the file and are checked by `body`.
 */
export type Endpoint<P extends z.ZodType = z.ZodType, Q extends z.ZodType = z.ZodType, B extends z.ZodType = z.ZodType, R extends z.ZodType = z.ZodType> = {
  method: 'get' | 'post' | 'put' | 'delete'
  path: string
  can: readonly [Action, SubjectName] | 'anyone' | 'signed-in'
  params: P
  query: Q
  body: B
  response: R
  takes: 'json' | 'file'
  answers: 'json' | 'file' | 'stream'
}

const Nothing = z.strictObject({})
type Nothing = typeof Nothing

/** Declares an operation; what is left out is empty. */
export function endpoint<P extends z.ZodType = Nothing, Q extends z.ZodType = Nothing, B extends z.ZodType = Nothing, R extends z.ZodType = z.ZodUndefined>(
  e: Pick<Endpoint, 'method' | 'path' | 'can'> & { params?: P; query?: Q; body?: B; response?: R; takes?: Endpoint['takes']; answers?: Endpoint['answers'] },
): Endpoint<P, Q, B, R> {
  return {
    method: e.method, path: e.path, can: e.can, takes: e.takes ?? 'json', answers: e.answers ?? 'json',
    params: e.params ?? (Nothing as unknown as P), query: e.query ?? (Nothing as unknown as Q),
    body: e.body ?? (Nothing as unknown as B), response: e.response ?? (z.undefined() as unknown as R),
  }
}
