import type * as z from 'zod'
import type { readLink as endpoint } from '../../../../shared/api/sessions.ts'
import { openLink } from './open-link.ts'

/** What a link is for and whose it is. */
export async function readLink(token: string): Promise<z.infer<typeof endpoint.response>> {
  const { link, person } = await openLink(token)
  return { purpose: link.purpose, email: person.email, name: person.name }
}
