import type { CookieOptions } from 'express'
import { outside } from '../../integrations/outside.ts'

/** `__Host-` ties the cookie to this host over https; plain http happens only on loopback, where that name is not allowed. */
export function sessionCookie(): { name: string; options: CookieOptions & { path: string } } {
  const secure = outside().settings.BASE_URL.startsWith('https:')
  return { name: secure ? '__Host-crosshead' : 'crosshead', options: { secure, httpOnly: true, sameSite: 'lax', path: '/' } }
}
