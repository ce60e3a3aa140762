import type { Requirement } from '../../../shared/api/orders.ts'
import type { TestState } from '../../../shared/api/words.ts'
import { fallback, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Test = table('Test', 'tests', {
  jobId: ref(), sampleId: ref(), customerId: ref(), siteId: ref(), position: integer(), methodId: text(), methodVersion: integer(), label: text(), parameters: json<Record<string, unknown>>(),
  requirement: maybe(json<Requirement>()), state: text<TestState>(), version: fallback(integer(), 0),
})
export type Test = Row<typeof Test>
