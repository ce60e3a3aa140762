import { ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Strike = table('Strike', 'strikes', {
  readingId: ref(), testRunId: ref(), reason: text(), byId: ref(),
})
export type Strike = Row<typeof Strike>
