import type { ReportContent } from '../../../shared/reports/content.ts'
import { instant, integer, json, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Report = table('Report', 'reports', {
  jobId: ref(), customerId: ref(), siteId: ref(), number: text(), revision: integer(), code: text(), content: json<ReportContent>(), signedById: ref(), issuedAt: instant(),
})
export type Report = Row<typeof Report>
