import type { ReportRow } from '../../../shared/api/reports.ts'
import type { Caller } from '../../caller.ts'
import { loadOne } from '../../models/load.ts'
import { Report } from '../../models/reports/report.ts'
import { reportRows } from './report-rows.ts'

/** One revision of a report. */
export async function readReport(reportId: string, caller: Caller): Promise<ReportRow> {
  const [row] = await reportRows([await loadOne(Report, 'Report', reportId, caller)])
  return row!
}
