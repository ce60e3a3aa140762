import { instant, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Link = table('Link', 'links', {
  personId: ref(), purpose: text<'invitation' | 'password reset'>(), tokenHash: text(), expiresAt: instant(), usedAt: maybe(instant()),
})
export type Link = Row<typeof Link>
