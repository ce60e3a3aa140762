import type { ErrorRequestHandler } from 'express'
import { MulterError } from 'multer'
import { BaseError, ConnectionError, DatabaseError, UniqueConstraintError } from 'sequelize'
import { ZodError } from 'zod'
import { Problem, problems } from '../../shared/problems.ts'
import { TooMany } from '../integrations/limits/too-many.ts'
import { log } from './log.ts'

/** Whatever was thrown, as a refusal people can act on; what nobody foresaw tells the caller nothing more. */
export function toProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  if (error instanceof ZodError) return new Problem('not-acceptable', 'some values are not acceptable', Object.fromEntries(error.issues.map((issue) => [issue.path.join('.') || 'body', issue.message])))
  if (error instanceof MulterError) return new Problem(error.code === 'LIMIT_FILE_SIZE' ? 'too-large' : 'not-acceptable', error.code === 'LIMIT_FILE_SIZE' ? 'the file is larger than 25 MB' : 'send one file, in the field "file"')
  if (error instanceof UniqueConstraintError) return new Problem('already-changed', 'someone else did this at the same moment; look again')
  if (isUnreadableText(error)) return new Problem('not-acceptable', 'some text holds a character that cannot be kept, such as a null character')
  if (isDatabaseAway(error)) return new Problem('unavailable', 'the database cannot be reached; nothing was changed, try again in a moment')
  if (error instanceof URIError) return new Problem('not-found', 'there is no such address')
  if (isBodyError(error)) return error.status === 413 ? new Problem('too-large', 'this is more than can be sent at once') : new Problem('not-acceptable', 'the request is not readable JSON')
  return new Problem('unexpected', 'something went wrong; it has been noted and nothing was half-written')
}

/** Of PostgreSQL: starting, stopping or ended by its operator; of the network: nobody there or gone. */
const away = new Set(['57P01', '57P02', '57P03', '08000', '08003', '08006', '53300', 'ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ENOTFOUND', 'ETIMEDOUT'])

/** PostgreSQL keeps neither null characters nor half a pair of UTF-16. */
const isUnreadableText = (error: unknown) => error instanceof DatabaseError && ['22021', '22P05'].includes((error.original as { code?: string }).code ?? '')

function isDatabaseAway(error: unknown): boolean {
  if (error instanceof ConnectionError) return true
  const cause: unknown = error instanceof DatabaseError ? error.original : error
  if (!(cause instanceof Error)) return false
  return ('code' in cause && away.has(String(cause.code))) || /^(Connection terminated|timeout exceeded when trying to connect)/.test(cause.message)
}

const isBodyError = (error: unknown): error is { status: number } => error instanceof Error && 'type' in error && 'status' in error && typeof error.status === 'number' && error.status >= 400 && error.status < 500

/** Answers every refusal as application/problem+json. */
export const answerProblem: ErrorRequestHandler = (error: unknown, req, res, next) => {
  const problem = toProblem(error)
  const status = problems[problem.code]
  if (status >= 500) log.error({ requestId: req.requestId, error: error instanceof BaseError ? { name: error.name, message: error.message, stack: error.stack } : error }, 'request failed')
  if (res.headersSent) return next(error)
  if (problem instanceof TooMany) res.set('Retry-After', String(problem.seconds))
  res.status(status).type('application/problem+json').send(JSON.stringify({ code: problem.code, detail: problem.message, fields: problem.fields, requestId: req.requestId }))
}
