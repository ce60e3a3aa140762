import type { Currency } from '../../../shared/api/words.ts'
import { big, instant, integer, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Payment = table('Payment', 'payments', {
  jobId: ref(), customerId: ref(), siteId: ref(), checkoutId: maybe(text()), url: maybe(text()), paymentIntentId: maybe(text()), amountMinor: big(), currency: text<Currency>(), jobVersion: integer(),
  state: text<'opening' | 'open' | 'paid' | 'closed' | 'refund owed' | 'refunded'>(), paidAt: maybe(instant()), refundId: maybe(text()),
})
export type Payment = Row<typeof Payment>
