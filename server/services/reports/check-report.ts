import { Op } from 'sequelize'
import type { ReportCheck } from '../../../shared/api/reports.ts'
import { Company } from '../../models/people/company.ts'
import { ReportState } from '../../models/reports/report-state.ts'
import { Report } from '../../models/reports/report.ts'
import { isReportCode } from './report-code.ts'

const answers = { current: 'genuine and current', superseded: 'superseded', withdrawn: 'withdrawn' } as const

/** Whether a report is genuine and current. Whatever is wrong, the answer is the same "unknown"; nothing is told of the customer. */
export async function checkReport({ number, code }: { number: string; code: string }): Promise<ReportCheck> {
  const company = (await Company.findOne({ raw: true }))?.name ?? ''
  const unknown: ReportCheck = { answer: 'unknown', number, company, issuedAt: null, sha256: null, revisions: [] }
  const [, base, revision] = /^(R-\d{2}-\d{5,9})\/(\d{1,4})$/.exec(number.toUpperCase()) ?? []
  const all = base ? await Report.findAll({ where: { number: base }, attributes: ['id', 'number', 'revision', 'code', 'issuedAt'], order: [['revision', 'ASC']], raw: true }) : []
  const report = all.find((one) => one.revision === Number(revision))
  // compared even where there is no such report, so that the time tells nothing
  if (!isReportCode(code, report?.code ?? '') || !report) return unknown
  const states = await ReportState.findAll({ where: { reportId: { [Op.in]: all.map(({ id }) => id) } }, raw: true })
  const stateOf = ({ id }: Pick<Report, 'id'>) => states.find(({ reportId }) => reportId === id)
  const own = stateOf(report)
  if (!own || own.state === 'being made') return unknown
  return {
    answer: answers[own.state], number: `${report.number}/${report.revision}`, company, issuedAt: report.issuedAt.toISOString(), sha256: own.sha256,
    revisions: all.flatMap((one) => {
      const state = stateOf(one)?.state
      return state && state !== 'being made' ? [{ number: `${one.number}/${one.revision}`, state, issuedAt: one.issuedAt.toISOString() }] : []
    }),
  }
}
