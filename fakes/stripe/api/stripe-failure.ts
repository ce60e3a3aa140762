export type StripeFailureBody = {
  type: 'invalid_request_error' | 'idempotency_error' | 'api_error' | 'card_error'
  message: string
  code?: string
  param?: string
}

/** A refusal in Stripe's shape: `{ error: { type, message, code?, param? } }` with its HTTP status. */
export class StripeFailure extends Error {
  readonly status: number
  readonly body: StripeFailureBody

  constructor(status: number, body: StripeFailureBody) {
    super(body.message)
    this.name = 'StripeFailure'
    this.status = status
    this.body = body
  }
}
