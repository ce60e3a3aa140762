import { Op } from 'sequelize'
import type { ReportRow } from '../../../shared/api/reports.ts'
import { Job } from '../../models/jobs/job.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import type { Report } from '../../models/reports/report.ts'

/** Reports as people see them in a list, in the order given. What they say is frozen, so names are those of the day of issue. */
export async function reportRows(reports: readonly Report[]): Promise<ReportRow[]> {
  const states = await ReportState.findAll({ where: { reportId: { [Op.in]: reports.map(({ id }) => id) } }, raw: true })
  const jobs = await Job.findAll({ where: { id: { [Op.in]: reports.map(({ jobId }) => jobId) } }, attributes: ['id', 'tests'], raw: true })
  return reports.flatMap((report) => {
    const state = states.find(({ reportId }) => reportId === report.id)
    if (!state) throw new Error(`report ${report.id} has no state`)
    const { id, number, revision, jobId, code, content, issuedAt } = report
    return [{
      id, number: `${number}/${revision}`, revision, jobId, jobNumber: content.jobNumber, customerName: content.customer.name, state: state.state, issuedAt: issuedAt.toISOString(), signedBy: content.signatory.name,
      purchaseOrder: content.purchaseOrder, samples: content.samples.length, tests: jobs.find((job) => job.id === jobId)?.tests ?? '', code, sha256: state.sha256, mailedTo: state.mailedTo, mailedAt: state.mailedAt?.toISOString() ?? null,
    }]
  })
}
