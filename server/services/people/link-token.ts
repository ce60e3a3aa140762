import { createHash, createHmac } from 'node:crypto'
import { outside } from '../../integrations/outside.ts'

/**
 * The secret part of an invitation or reset link: 256 bits that only who knows the session secret can work out from the
 * link's id. So it is stored nowhere in plain, and a mail that is sent again holds the same link.
 */
export function linkToken(linkId: string): string {
  return createHmac('sha256', outside().settings.SESSION_SECRET).update(`link:${linkId}`).digest('base64url')
}

/** What the database keeps of a token. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
