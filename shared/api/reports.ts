import * as z from 'zod'
import { Day, Id, Instant, Money, page, PageById } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { Currency, ReportState } from './words.ts'

export const ReportRow = z.object({
  id: Id, number: z.string(), revision: z.int(), jobId: Id, jobNumber: z.string(), customerName: z.string(), state: ReportState, issuedAt: Instant.nullable(), signedBy: z.string(),
  purchaseOrder: z.string(), samples: z.int(), tests: z.string(), code: z.string(), sha256: z.string().nullable(), mailedTo: z.string().nullable(), mailedAt: Instant.nullable(),
})
export type ReportRow = z.infer<typeof ReportRow>
const OneReport = z.strictObject({ reportId: Id })
export const listReports = endpoint({ method: 'get', path: '/reports', can: ['read', 'Report'], query: z.strictObject({ ...PageById, search: z.string().trim().max(100).optional() }), response: page(ReportRow) })
export const readReport = endpoint({ method: 'get', path: '/reports/:reportId', can: ['read', 'Report'], params: OneReport, response: ReportRow })
export const downloadReport = endpoint({ method: 'get', path: '/reports/:reportId/pdf', can: ['read', 'Report'], params: OneReport, answers: 'file' })

/** Whether a report is genuine and current, for anyone who holds its number and code; says nothing of the customer. */
export const checkReport = endpoint({
  method: 'get', path: '/report-checks', can: 'anyone',
  query: z.strictObject({ number: z.string().trim().max(40), code: z.string().trim().max(40) }),
  response: z.object({
    answer: z.enum(['genuine and current', 'superseded', 'withdrawn', 'unknown']), number: z.string(), company: z.string(), issuedAt: Instant.nullable(), sha256: z.string().nullable(),
    revisions: z.array(z.object({ number: z.string(), state: ReportState, issuedAt: Instant.nullable() })),
  }),
})
export type ReportCheck = z.infer<typeof checkReport.response>

export const InvoiceRow = z.object({
  id: Id, number: z.string(), jobId: Id, jobNumber: z.string(), customerName: z.string(), customerAddress: z.string(), purchaseOrder: z.string(), issuedOn: Day, currency: Currency,
  lines: z.array(z.object({ name: z.string(), count: z.int(), unitMinor: Money, totalMinor: Money })), netMinor: Money, taxPercent: z.number(), taxMinor: Money, totalMinor: Money,
  paidMinor: Money, refundedMinor: Money,
})
export type InvoiceRow = z.infer<typeof InvoiceRow>
export const listInvoices = endpoint({ method: 'get', path: '/invoices', can: ['read', 'Invoice'], query: z.strictObject(PageById), response: page(InvoiceRow) })
export const readInvoice = endpoint({ method: 'get', path: '/invoices/:invoiceId', can: ['read', 'Invoice'], params: z.strictObject({ invoiceId: Id }), response: InvoiceRow })

export const reportEndpoints = [listReports, readReport, downloadReport, checkReport, listInvoices, readInvoice]
