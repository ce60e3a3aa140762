import type { Caller } from '../../caller.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'
import { jobView } from '../jobs/view/job-view.ts'
import { settlePayment } from './settle-payment.ts'
import { withPaymentService } from './with-payment-service.ts'

/** Asks the payment service how the job's payment stands, and acts on it: a client who comes back must not wait for a notice. */
export async function checkPayment(jobId: string, caller: Caller) {
  must(caller, 'pay', 'Job', await loadOne(Job, 'Job', jobId, caller))
  const open = await Payment.findOne({ where: { jobId, state: 'open' }, raw: true })
  const checkoutId = open?.checkoutId
  if (checkoutId) await withPaymentService(() => settlePayment(checkoutId, caller))
  return jobView(jobId, caller)
}
