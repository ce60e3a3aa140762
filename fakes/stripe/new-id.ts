import { randomBytes } from 'node:crypto'

/** An id in Stripe's manner, such as `pi_` and 24 letters or digits. */
export function newId(prefix: string, length = 24): string {
  const text = randomBytes(length * 2).toString('base64').replace(/[^A-Za-z0-9]/g, '')
  return `${prefix}_${text.slice(0, length)}`
}
