/**
 * Why a payment call failed:
 * - `bad-signature`: a notice that does not carry a valid, recent signature
 * - `not-found`: the payment service knows no such checkout, payment or refund
 * - `not-acceptable`: the service understood and said no (refund above what was paid, checkout already closed)
 * - `unavailable`: no answer, or a fault on its side; the same call may be sent again with the same idempotency key
 */
export type PaymentErrorReason = 'bad-signature' | 'not-found' | 'not-acceptable' | 'unavailable'

export class PaymentError extends Error {
  readonly reason: PaymentErrorReason

  constructor(reason: PaymentErrorReason, message: string, options?: ErrorOptions) {
    super(message, options)
    this.name = 'PaymentError'
    this.reason = reason
  }
}
