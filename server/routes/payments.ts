import type { Router } from 'express'
import { checkPayment as checkEndpoint, payJob as payEndpoint, reopenDraft as reopenEndpoint } from '../../shared/api/jobs.ts'
import { listInvoices as listEndpoint, readInvoice as readEndpoint } from '../../shared/api/reports.ts'
import { route } from '../http/route.ts'
import { checkPayment } from '../services/billing/check-payment.ts'
import { listInvoices } from '../services/billing/list-invoices.ts'
import { payJob } from '../services/billing/pay-job.ts'
import { readInvoice } from '../services/billing/read-invoice.ts'
import { reopenDraft } from '../services/billing/reopen-draft.ts'
import { takePaymentNotice } from '../services/billing/take-payment-notice.ts'

export function paymentRoutes(router: Router): void {
  route(router, payEndpoint, ({ params, body }, caller) => payJob(params.jobId, body, caller))
  route(router, checkEndpoint, ({ params }, caller) => checkPayment(params.jobId, caller))
  route(router, reopenEndpoint, ({ params, body }, caller) => reopenDraft(params.jobId, body, caller))
  route(router, listEndpoint, ({ query }, caller) => listInvoices(query, caller))
  route(router, readEndpoint, ({ params }, caller) => readInvoice(params.invoiceId, caller))
}

/** Notices are no operation of ours: their shape is the payment service's. The app hands over the raw body, which is what is signed. */
export function paymentNoticeRoute(router: Router): void {
  router.post('/payments/notices', async (req, res) => {
    const body: unknown = req.body
    await takePaymentNotice(Buffer.isBuffer(body) ? body : Buffer.alloc(0), req.get('stripe-signature') ?? '')
    res.status(204).end()
  })
}
