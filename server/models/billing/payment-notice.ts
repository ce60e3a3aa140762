import { maybe, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const PaymentNotice = table('PaymentNotice', 'payment_notices', {
  noticeId: text(), type: text(), checkoutId: maybe(text()),
})
export type PaymentNotice = Row<typeof PaymentNotice>
