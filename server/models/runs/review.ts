import { json, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Review = table('Review', 'reviews', {
  testRunId: ref(), outcome: text<'accepted' | 'sent back'>(), remark: text(), readings: json<string[]>(), byId: ref(),
})
export type Review = Row<typeof Review>
