import { createHmac } from 'node:crypto'

/** The `Stripe-Signature` header: time stamp and HMAC-SHA256 over `time.body`. */
export function sign(body: string, secret: string, seconds = Math.floor(Date.now() / 1000)): string {
  return `t=${seconds},v1=${createHmac('sha256', secret).update(`${seconds}.${body}`).digest('hex')}`
}
