import { Op, type Transaction, type WhereOptions } from 'sequelize'
import type { Job as JobView } from '../../../../shared/api/jobs.ts'
import { lateDays } from '../../../../shared/orders/late-days.ts'
import { notYetReportable } from '../../../../shared/orders/not-yet-reportable.ts'
import type { Caller } from '../../../caller.ts'
import { accessibleWhere } from '../../../models/accessible.ts'
import { Invoice } from '../../../models/billing/invoice.ts'
import { File } from '../../../models/jobs/file.ts'
import { Hold } from '../../../models/jobs/hold.ts'
import { Job } from '../../../models/jobs/job.ts'
import { Message } from '../../../models/jobs/message.ts'
import { Sample } from '../../../models/jobs/sample.ts'
import { loadOne } from '../../../models/load.ts'
import { Customer } from '../../../models/people/customer.ts'
import { Person } from '../../../models/people/person.ts'
import { Report } from '../../../models/reports/report.ts'
import { ReportState } from '../../../models/reports/report-state.ts'
import { Site } from '../../../models/sites/site.ts'
import { fileView } from '../../files/file-view.ts'
import { dayIn } from '../day-in.ts'
import { holdViews } from '../talk/hold-views.ts'
import { sampleViews } from './sample-views.ts'

/** A job as the caller may see it, with all that hangs on it. */
export async function jobView(jobId: string, caller: Caller, tx?: Transaction): Promise<JobView> {
  const job = await loadOne(Job, 'Job', jobId, caller, { tx })
  const site = await Site.findByPk(job.siteId, { raw: true, transaction: tx })
  const customer = await Customer.findByPk(job.customerId, { raw: true, transaction: tx })
  if (!site || !customer) throw new Error(`job ${job.number} has no site or customer`)
  const here = { where: { jobId }, raw: true as const, transaction: tx }
  const reports = await reportsOf(jobId, caller, tx)
  const report = reports.find(({ state }) => state !== 'superseded') ?? null
  const dates = { placedAt: iso(job.placedAt), promisedAt: iso(job.promisedAt), expectedAt: iso(job.expectedAt), createdAt: job.createdAt.toISOString() }
  const samples = await Sample.findAll({ ...here, order: [['position', 'ASC']] })
  const views = await sampleViews(samples, { state: job.state, placedAt: dates.placedAt, expectedAt: dates.expectedAt, report, siteName: site.name }, tx)
  const allowedFiles = accessibleWhere(caller.ability, 'read', 'File')
  const files = allowedFiles ? await File.findAll({ where: allOf({ jobId, removedAt: null, purpose: { [Op.ne]: 'report' } }, allowedFiles), order: [['id', 'ASC']], raw: true, transaction: tx }) : []
  const invoice = caller.ability.can('read', 'Invoice') ? await Invoice.findOne({ ...here, attributes: ['id'] }) : null
  const { id, number, customerId, siteId, state, money, waitsForPayment, version, order, netMinor, taxMinor, totalMinor, currency, lines } = job
  return {
    id, number, customerId, customerName: customer.name, siteId, siteName: site.name, siteAddress: site.address, timeZone: site.timeZone,
    state, money, waitsForPayment, version, order, netMinor, taxMinor, totalMinor, currency, lines, ...dates, lateDays: daysLate(job, site.timeZone, report?.issuedAt ?? null),
    samples: views, holds: await holdViews(await Hold.findAll({ ...here, order: [['id', 'ASC']] }), tx), messages: await messagesOf(jobId, caller, tx), files: files.map(fileView),
    reports, invoiceId: invoice?.id ?? null, notYetReportable: notYetReportable({ state, holds: job.holds, tests: views.flatMap(({ tests }) => tests) }),
  }
}

const iso = (at: Date | null) => at?.toISOString() ?? null

function allOf(...conditions: WhereOptions[]): WhereOptions {
  return { [Op.and]: conditions }
}

/** Whole days past the day it was needed by or promised for: at its issue, or as it stands now. */
export function daysLate(job: Pick<Job, 'state' | 'neededBy' | 'promisedAt' | 'expectedAt'>, timeZone: string, issuedAt: string | null): number {
  if (job.state === 'draft' || job.state === 'cancelled') return 0
  const due = job.neededBy ?? (job.promisedAt && dayIn(timeZone, job.promisedAt))
  if (issuedAt) return lateDays(due, dayIn(timeZone, new Date(issuedAt)))
  const today = dayIn(timeZone, new Date())
  const expected = job.expectedAt ? dayIn(timeZone, job.expectedAt) : today
  return lateDays(due, expected > today ? expected : today)
}

async function reportsOf(jobId: string, caller: Caller, tx: Transaction | undefined): Promise<JobView['reports']> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Report')
  const reports = allowed ? await Report.findAll({ where: allOf({ jobId }, allowed), attributes: ['id', 'number', 'revision', 'issuedAt'], order: [['id', 'DESC']], raw: true, transaction: tx }) : []
  const states = await ReportState.findAll({ where: { reportId: { [Op.in]: reports.map(({ id }) => id) } }, raw: true, transaction: tx })
  return reports.map(({ id, number, revision, issuedAt }) => ({
    id, number: `${number}/${revision}`, state: states.find(({ reportId }) => reportId === id)?.state ?? 'being made', issuedAt: issuedAt.toISOString(),
  }))
}

async function messagesOf(jobId: string, caller: Caller, tx: Transaction | undefined): Promise<JobView['messages']> {
  const messages = await Message.findAll({ where: { jobId }, order: [['id', 'ASC']], raw: true, transaction: tx })
  const people = await Person.findAll({ where: { id: { [Op.in]: messages.map(({ byId }) => byId) } }, attributes: ['id', 'name'], raw: true, transaction: tx })
  return messages.map(({ id, byId, text, createdAt }) => ({
    id, by: people.find((person) => person.id === byId)?.name ?? '', mine: byId === caller.person.id, text, at: createdAt.toISOString(), files: [],
  }))
}
