import type { Readable } from 'node:stream'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { loadOne } from '../../models/load.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import { Report } from '../../models/reports/report.ts'
import { withFileStore } from '../files/with-file-store.ts'

/** A report's file; who took it is noted. */
export async function downloadReport(reportId: string, caller: Caller): Promise<{ name: string; mediaType: string; content: Readable }> {
  const report = await loadOne(Report, 'Report', reportId, caller)
  const state = await ReportState.findOne({ where: { reportId }, raw: true })
  const file = state?.fileId ? await File.findByPk(state.fileId, { raw: true }) : null
  if (!file) throw new Problem('not-now', `report ${report.number}/${report.revision} is still being made`)
  const content = await withFileStore(() => outside().files.open(file.storeKey))
  const { jobId, customerId, siteId } = report
  await inTransaction(caller, (tx) => {
    tx.record({ type: 'report.downloaded', id: reportId, jobId, customerId, siteId, data: { number: `${report.number}/${report.revision}`, sha256: file.sha256 } })
    return Promise.resolve()
  }).catch((error: unknown) => {
    content.destroy()
    throw error
  })
  return { name: file.name, mediaType: file.mediaType, content }
}
