import { StripeFailure } from './stripe-failure.ts'

/** The record, or Stripe's answer for an id it does not know. */
export function found<T>(records: Record<string, T>, id: string, kind: string, param = 'id', status = 404): T {
  const record = Object.hasOwn(records, id) ? records[id] : undefined
  if (record === undefined) {
    throw new StripeFailure(status, { type: 'invalid_request_error', code: 'resource_missing', param, message: `No such ${kind}: '${id}'` })
  }
  return record
}
