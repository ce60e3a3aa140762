import type { InvoiceRow } from '../../../shared/api/reports.ts'
import type { Caller } from '../../caller.ts'
import { Invoice } from '../../models/billing/invoice.ts'
import { loadOne } from '../../models/load.ts'
import { invoiceViews } from './invoice-views.ts'

/** One invoice, as it was issued. */
export async function readInvoice(invoiceId: string, caller: Caller): Promise<InvoiceRow> {
  const [view] = await invoiceViews([await loadOne(Invoice, 'Invoice', invoiceId, caller)])
  if (!view) throw new Error('an invoice gave no view')
  return view
}
