import type { Quote } from '../../../shared/api/orders.ts'
import type { Currency } from '../../../shared/api/words.ts'
import { big, day, fallback, integer, json, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Invoice = table('Invoice', 'invoices', {
  number: text(), jobId: ref(), customerId: ref(), siteId: ref(), issuedOn: day(), currency: text<Currency>(), lines: json<Quote['lines']>(), netMinor: big(), taxPercent: integer(), taxMinor: big(), totalMinor: big(),
  paidMinor: big(), refundedMinor: fallback(big(), 0),
})
export type Invoice = Row<typeof Invoice>
