import { integer, real, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Result = table('Result', 'results', {
  testRunId: ref(), testId: ref(), sampleId: ref(), jobId: ref(), customerId: ref(), siteId: ref(), methodId: text(), key: text(), symbol: text(), value: real(), unit: text(), reported: text(), position: integer(),
})
export type Result = Row<typeof Result>
