import type * as z from 'zod'
import { StripeFailure } from './stripe-failure.ts'

/** Checks a body or a query; the first fault becomes Stripe's answer and names its parameter as `a[0][b]`. */
export function parseForm<S extends z.ZodType>(schema: S, form: unknown): z.infer<S> {
  const parsed = schema.safeParse(form ?? {})
  if (parsed.success) return parsed.data
  const issue = parsed.error.issues[0]
  if (!issue) throw new StripeFailure(400, { type: 'invalid_request_error', message: 'The request could not be read.' })
  if (issue.code === 'unrecognized_keys') {
    const param = bracketed([...issue.path, ...issue.keys.slice(0, 1)])
    throw new StripeFailure(400, { type: 'invalid_request_error', code: 'parameter_unknown', param, message: `Received unknown parameter: ${param}` })
  }
  const param = bracketed(issue.path)
  if (issue.code === 'invalid_type' && issue.input === undefined) {
    throw new StripeFailure(400, { type: 'invalid_request_error', code: 'parameter_missing', param, message: `Missing required param: ${param}.` })
  }
  throw new StripeFailure(400, { type: 'invalid_request_error', code: 'parameter_invalid', param, message: `Invalid ${param}: ${issue.message}` })
}

function bracketed(path: PropertyKey[]): string {
  return path.map((part, index) => (index === 0 ? String(part) : `[${String(part)}]`)).join('')
}
