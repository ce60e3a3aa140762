import type { InvoiceRow } from '../../../shared/api/reports.ts'
import { formatMoney } from '../../lib/format.ts'

/** How an invoice stands, in words: "paid", "paid £10.00 of it", "refunded £610.00". */
export function invoiceStanding({ totalMinor, paidMinor, refundedMinor, currency }: Pick<InvoiceRow, 'totalMinor' | 'paidMinor' | 'refundedMinor' | 'currency'>): string {
  if (refundedMinor >= paidMinor && refundedMinor > 0) return 'refunded'
  if (refundedMinor > 0) return `refunded ${formatMoney(refundedMinor, currency)}`
  if (paidMinor >= totalMinor) return 'paid'
  return paidMinor > 0 ? `paid ${formatMoney(paidMinor, currency)} of it` : 'to pay'
}
