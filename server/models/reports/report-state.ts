import type { ReportState as State } from '../../../shared/api/words.ts'
import { instant, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

/** What may change about a report: whether it is current, its file once made, and its mail. The report itself never changes. */
export const ReportState = table('ReportState', 'report_states', {
  reportId: ref(), state: text<State>(), fileId: maybe(ref()), sha256: maybe(text()), madeAt: maybe(instant()), mailedTo: maybe(text()), mailedAt: maybe(instant()),
})
export type ReportState = Row<typeof ReportState>
