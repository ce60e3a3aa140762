import { outside } from '../../integrations/outside.ts'
import { PaymentNotice } from '../../models/billing/payment-notice.ts'
import { settlePayment } from './settle-payment.ts'
import { withPaymentService } from './with-payment-service.ts'

/**
 * A signed notice of the payment service: a hint to look. Its id is kept after the work is done, so that one whose work failed
 * is taken again when it is sent again; two at once do the same work, which is done once.
 */
export async function takePaymentNotice(rawBody: Buffer, signature: string): Promise<void> {
  await withPaymentService(async () => {
    const notice = outside().payment.readNotice(rawBody, signature)
    if (await PaymentNotice.count({ where: { noticeId: notice.id } })) return
    if (notice.checkoutId) await settlePayment(notice.checkoutId, { person: null, requestId: `notice:${notice.id}` })
    await PaymentNotice.bulkCreate([{ noticeId: notice.id, type: notice.type, checkoutId: notice.checkoutId ?? null }], { ignoreDuplicates: true })
  })
}
