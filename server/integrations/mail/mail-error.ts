/**
 * - `refused`: the mail server said no for good (5xx), or the mail itself is not sendable; trying again does not help
 * - `unavailable`: no connection, a timeout or a temporary refusal (4xx); send the same mail again later
 */
export type MailErrorReason = 'refused' | 'unavailable'

export class MailError extends Error {
  readonly reason: MailErrorReason

  constructor(reason: MailErrorReason, message: string, options?: ErrorOptions) {
    super(message, options)
    this.name = 'MailError'
    this.reason = reason
  }
}
