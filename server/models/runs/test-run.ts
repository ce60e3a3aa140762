import type { RunState } from '../../../shared/api/words.ts'
import type { Evaluation } from '../../../shared/method/method.ts'
import { fallback, instant, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const TestRun = table('TestRun', 'test_runs', {
  testId: ref(), sampleId: ref(), jobId: ref(), stepId: ref(), siteId: ref(), benchId: ref(), equipmentId: maybe(ref()), performedById: ref(), number: integer(), methodId: text(), methodVersion: integer(),
  state: text<RunState>(), evaluation: maybe(json<Evaluation>()), remark: fallback(text(), ''), startedAt: instant(), recordedAt: maybe(instant()), version: fallback(integer(), 0),
})
export type TestRun = Row<typeof TestRun>
