import type { StepState } from '../../../shared/api/words.ts'
import type { StepKind, StepNeed } from '../../../shared/method/method.ts'
import { fallback, instant, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Step = table('Step', 'steps', {
  sampleId: ref(), jobId: ref(), testId: maybe(ref()), siteId: ref(), position: integer(), type: text<StepKind>(), label: text(), capability: text(), need: json<StepNeed>(), state: text<StepState>(),
  benchId: maybe(ref()), startedAt: maybe(instant()), startedById: maybe(ref()), endedAt: maybe(instant()), remark: fallback(text(), ''),
})
export type Step = Row<typeof Step>
