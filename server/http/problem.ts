import type { ErrorRequestHandler } from 'express'
import { MulterError } from 'multer'
import { BaseError, ConnectionError, UniqueConstraintError } from 'sequelize'
import { ZodError } from 'zod'
import { Problem, problems } from '../../shared/problems.ts'
import { log } from './log.ts'

/** Whatever was thrown, as a refusal people can act on; what nobody foresaw tells the caller nothing more. */
export function toProblem(error: unknown): Problem {
  if (error instanceof Problem) return error
  if (error instanceof ZodError) return new Problem('not-acceptable', 'some values are not acceptable', Object.fromEntries(error.issues.map((issue) => [issue.path.join('.') || 'body', issue.message])))
  if (error instanceof MulterError) return new Problem(error.code === 'LIMIT_FILE_SIZE' ? 'too-large' : 'not-acceptable', error.code === 'LIMIT_FILE_SIZE' ? 'the file is larger than 25 MB' : 'send one file, in the field "file"')
  if (error instanceof UniqueConstraintError) return new Problem('already-changed', 'someone else did this at the same moment; look again')
  if (error instanceof ConnectionError) return new Problem('unavailable', 'the database cannot be reached; nothing was changed, try again in a moment')
  if (isBodyError(error)) return error.status === 413 ? new Problem('too-large', 'this is more than can be sent at once') : new Problem('not-acceptable', 'the request is not readable JSON')
  return new Problem('unexpected', 'something went wrong; it has been noted and nothing was half-written')
}

const isBodyError = (error: unknown): error is { status: number } => error instanceof Error && 'status' in error && (error.status === 400 || error.status === 413)

/** Answers every refusal as application/problem+json. */
export const answerProblem: ErrorRequestHandler = (error: unknown, req, res, next) => {
  const problem = toProblem(error)
  const status = problems[problem.code]
  if (status >= 500) log.error({ requestId: req.requestId, error: error instanceof BaseError ? { name: error.name, message: error.message, stack: error.stack } : error }, 'request failed')
  if (res.headersSent) return next(error)
  res.status(status).type('application/problem+json').send(JSON.stringify({ code: problem.code, detail: problem.message, fields: problem.fields, requestId: req.requestId }))
}
