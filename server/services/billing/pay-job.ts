import type { OrderFault } from '../../../shared/api/orders.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Payment } from '../../models/billing/payment.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { columnsOf, orderTerms } from '../jobs/order-terms.ts'
import { quoteFor } from '../jobs/quote-for.ts'
import { moveToSite } from '../jobs/save-draft.ts'
import { openCheckout } from './open-checkout.ts'

/** Opens the payment page for a draft without faults, at the site with the earliest finish. Asked again, it gives the same page. */
export async function payJob(jobId: string, { version }: { version: number }, caller: Caller): Promise<{ url: string }> {
  const seen = await loadOne(Job, 'Job', jobId, caller)
  const best = seen.waitsForPayment || seen.version !== version ? null : (await quoteFor(seen.order, await orderTerms(seen.customerId), new Date())).promise
  const payment = await inTransaction(caller, async (tx) => {
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    must(caller, 'pay', 'Job', job)
    mustBeCurrent(job, version, 'This draft')
    if (job.state !== 'draft') throw new Problem('not-now', `job ${job.number} is ${job.state} and ${job.money}`)
    const open = await Payment.findOne({ where: { jobId, state: ['opening', 'open'] }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
    if (open) return open
    const terms = await orderTerms(job.customerId, tx)
    mustHaveNoFaults((await quoteFor(job.order, terms, new Date())).faults)
    const { totalMinor, siteId: firstSite } = columnsOf(job.order, terms)
    if (totalMinor !== job.totalMinor) throw new Problem('not-now', 'prices have changed since this draft was saved; save it again and look at the new total')
    const siteId = best?.siteId ?? firstSite
    if (siteId !== job.siteId) await moveToSite(jobId, siteId, tx)
    await Job.update({ waitsForPayment: true, siteId }, { where: { id: jobId }, transaction: tx })
    const { customerId, currency } = job
    const created = await Payment.create({ jobId, customerId, siteId, amountMinor: totalMinor, currency, jobVersion: job.version, state: 'opening' }, { transaction: tx })
    tx.record({ type: 'job.checkout-opened', id: jobId, jobId, customerId, siteId, data: { paymentId: created.id, amountMinor: totalMinor, currency } })
    return created.get({ plain: true })
  })
  return { url: await openCheckout(payment.id, caller) }
}

function mustHaveNoFaults(faults: readonly OrderFault[]): void {
  if (faults.length === 0) return
  const fields = faults.slice(0, 100).map(({ row, column, field, message }): [string, string] => {
    const place = row !== null ? `order.samples.${row}` : column !== null ? `order.columns.${column}` : 'order'
    return [`${place}.${field}`, message]
  })
  throw new Problem('not-acceptable', faults.length === 1 ? 'one thing has to be put right before this can be paid' : `${faults.length} things have to be put right before this can be paid`, Object.fromEntries(fields))
}
