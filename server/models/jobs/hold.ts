import { fallback, instant, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Hold = table('Hold', 'holds', {
  jobId: ref(), sampleId: maybe(ref()), customerId: ref(), siteId: ref(), reason: text(), question: text(), answers: json<string[]>(), answer: maybe(text()), placedById: ref(), answeredById: maybe(ref()),
  answeredAt: maybe(instant()), releasedAt: maybe(instant()), version: fallback(integer(), 0),
})
export type Hold = Row<typeof Hold>
