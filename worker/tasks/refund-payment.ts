import * as z from 'zod'
import { refundPayment as refund } from '../../server/services/billing/refund-payment.ts'
import { task } from '../task.ts'

/** Pays back what a customer paid for a job that was cancelled, had changed, or was paid already. */
export const refundPayment = task({
  name: 'refund-payment', on: ['payment.refund-owed'], payload: z.object({ paymentId: z.uuid() }), attempts: 8,
  run: ({ paymentId }) => refund(paymentId, { person: null, requestId: 'task:refund-payment' }),
})
