import type { SampleState } from '../../../shared/api/words.ts'
import type { Piece } from '../../../shared/method/piece.ts'
import { fallback, flag, instant, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Sample = table('Sample', 'samples', {
  jobId: ref(), customerId: ref(), siteId: ref(), number: text(), code: text(), position: integer(), heat: text(), lot: text(), material: text(), piece: json<Piece>(), state: text<SampleState>(),
  onHold: fallback(flag(), false), condition: fallback(text(), ''), receivedAt: maybe(instant()), receivedById: maybe(ref()), version: fallback(integer(), 0),
})
export type Sample = Row<typeof Sample>
