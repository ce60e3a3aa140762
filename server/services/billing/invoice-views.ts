import { Op } from 'sequelize'
import type { InvoiceRow } from '../../../shared/api/reports.ts'
import type { Invoice } from '../../models/billing/invoice.ts'
import { Job } from '../../models/jobs/job.ts'
import { Customer } from '../../models/people/customer.ts'

/** Invoices as people see them, in the order given. */
export async function invoiceViews(invoices: readonly Invoice[]): Promise<InvoiceRow[]> {
  const jobs = await Job.findAll({ where: { id: { [Op.in]: invoices.map(({ jobId }) => jobId) } }, attributes: ['id', 'number', 'purchaseOrder'], raw: true })
  const customers = await Customer.findAll({ where: { id: { [Op.in]: invoices.map(({ customerId }) => customerId) } }, raw: true })
  return invoices.map(({ id, number, jobId, customerId, issuedOn, currency, lines, netMinor, taxPercent, taxMinor, totalMinor, paidMinor, refundedMinor }) => {
    const job = jobs.find((one) => one.id === jobId)
    const customer = customers.find((one) => one.id === customerId)
    return {
      id, number, jobId, jobNumber: job?.number ?? '', purchaseOrder: job?.purchaseOrder ?? '', customerName: customer?.name ?? '', customerAddress: customer?.address ?? '',
      issuedOn, currency, lines, netMinor, taxPercent, taxMinor, totalMinor, paidMinor, refundedMinor,
    }
  })
}
