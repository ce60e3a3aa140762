import { json, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Reading = table('Reading', 'readings', {
  testRunId: ref(), key: text(), path: text(), value: json<unknown>(), byId: ref(),
})
export type Reading = Row<typeof Reading>
