import { buffer } from 'node:stream/consumers'
import { inTransaction, type Actor } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { Customer } from '../../models/people/customer.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import { Report } from '../../models/reports/report.ts'
import { sendOnce } from '../mails/send-once.ts'

/** Mails a report to where its customer wants reports, once, and notes that it went. */
export async function deliverReport(reportId: string, actor: Actor): Promise<void> {
  const [report, state] = [await Report.findByPk(reportId, { raw: true, rejectOnEmpty: true }), await ReportState.findOne({ where: { reportId }, raw: true, rejectOnEmpty: true })]
  if (state.mailedAt || state.state === 'withdrawn') return
  if (!state.fileId) throw new Error(`report ${report.number}/${report.revision} has no file yet`)
  const [customer, file] = [await Customer.findByPk(report.customerId, { raw: true, rejectOnEmpty: true }), await File.findByPk(state.fileId, { raw: true, rejectOnEmpty: true })]
  const { content } = report
  await sendOnce({
    key: `report:${reportId}`, to: customer.reportEmail, subject: `Test report ${report.number}/${report.revision}${content.purchaseOrder ? `, your order ${oneLine(content.purchaseOrder)}` : ''}`, text: letter(content),
    attachments: [{ filename: file.name, contentType: file.mediaType, content: await buffer(await outside().files.open(file.storeKey)) }],
  })
  await inTransaction(actor, async (tx) => {
    const [noted] = await ReportState.update({ mailedTo: customer.reportEmail, mailedAt: new Date() }, { where: { reportId, mailedAt: null }, transaction: tx })
    if (noted === 0) return
    const { jobId, customerId, siteId } = report
    tx.record({ type: 'report.mailed', id: reportId, jobId, customerId, siteId, data: { number: `${report.number}/${report.revision}`, to: customer.reportEmail, text: customer.reportEmail }, touches: [{ subject: 'Job', id: jobId }] })
  })
}

function letter({ company, customer, number, revision, jobNumber, purchaseOrder, samples, supersedes, checkAddress, code }: Report['content']): string {
  return [
    `To ${customer.name}`, '',
    `Attached is test report ${number}/${revision} for job ${jobNumber}${purchaseOrder ? `, your order ${purchaseOrder}` : ''}: ${samples.length === 1 ? '1 sample' : `${samples.length} samples`}.`,
    ...(supersedes ? ['', `It replaces ${supersedes.number}. Changed: ${supersedes.changes.join('; ')}.`] : []), '',
    'Anyone who holds the report can check that it is genuine and current:', `${checkAddress}`, `report ${number}/${revision}, code ${code}`, '',
    company.name, company.address, company.email, '',
  ].join('\n')
}

const oneLine = (text: string) => text.replace(/\s+/g, ' ').slice(0, 100)
