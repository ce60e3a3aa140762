import { Readable } from 'node:stream'
import { Op } from 'sequelize'
import { ReportContent } from '../../../shared/reports/content.ts'
import { inTransaction, type Actor } from '../../database/transaction.ts'
import type { StoredFile } from '../../integrations/files/file-store.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import { Report } from '../../models/reports/report.ts'
import { drawReport } from './draw/draw-report.ts'
import { reportFileName } from './report-file-name.ts'

/** Draws and keeps a report's file, once: whoever comes second takes their copy away again. An earlier revision is superseded in the same moment. */
export async function makeReport(reportId: string, actor: Actor): Promise<void> {
  const state = await ReportState.findOne({ where: { reportId }, raw: true })
  if (state?.state !== 'being made') return
  const report = await Report.findByPk(reportId, { raw: true, rejectOnEmpty: true })
  const { files } = outside()
  const stored = await files.put(Readable.from(await drawReport(ReportContent.parse(report.content)), { objectMode: false }))
  const isKept = await keepFile(report, stored, actor).catch(async (error: unknown) => {
    await files.remove(stored.key)
    throw error
  })
  if (!isKept) await files.remove(stored.key)
}

function keepFile(report: Report, { key, size, sha256 }: StoredFile, actor: Actor): Promise<boolean> {
  const { id, jobId, customerId, siteId, number, revision } = report
  return inTransaction(actor, async (tx) => {
    const state = await ReportState.findOne({ where: { reportId: id, state: 'being made' }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    if (!state) return false
    const file = await File.create({ jobId, customerId, siteId, visibleToCustomer: true, purpose: 'report', name: reportFileName(report), mediaType: 'application/pdf', size, sha256, storeKey: key }, { transaction: tx })
    await ReportState.update({ state: 'current', fileId: file.get('id'), sha256, madeAt: new Date() }, { where: { id: state.id }, transaction: tx })
    const earlier = await Report.findAll({ where: { jobId, revision: { [Op.lt]: revision } }, attributes: ['id'], raw: true, transaction: tx })
    await ReportState.update({ state: 'superseded' }, { where: { reportId: { [Op.in]: earlier.map((one) => one.id) }, state: 'current' }, transaction: tx })
    tx.record({ type: 'report.issued', id, jobId, customerId, siteId, data: { number: `${number}/${revision}`, sha256, text: `${number}/${revision}` }, touches: [{ subject: 'Job', id: jobId }] })
    return true
  })
}
