import type { Role } from '../../../shared/api/words.ts'
import { fallback, instant, integer, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Person = table('Person', 'people', {
  name: text(), email: text(), role: text<Role>(), siteId: maybe(ref()), customerId: maybe(ref()), state: text<'invited' | 'active' | 'disabled'>(),
  passwordHash: maybe(text()), sessionEpoch: fallback(integer(), 0), lastSignInAt: maybe(instant()), version: fallback(integer(), 0),
})
export type Person = Row<typeof Person>
