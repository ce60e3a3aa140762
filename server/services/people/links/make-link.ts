import { v7 } from 'uuid'
import type { Tx } from '../../../database/transaction.ts'
import { Link } from '../../../models/people/link.ts'
import { hashToken, linkToken } from '../link-token.ts'

const hour = 3_600_000
const lifetimes = { invitation: 72 * hour, 'password reset': hour } as const

/** Writes a link of which the database keeps only the token's hash; gives its id, from which the task makes the mail's link. */
export async function makeLink(personId: string, purpose: Link['purpose'], tx: Tx): Promise<string> {
  const id = v7()
  await Link.create({ id, personId, purpose, tokenHash: hashToken(linkToken(id)), expiresAt: new Date(Date.now() + lifetimes[purpose]) }, { transaction: tx })
  return id
}
