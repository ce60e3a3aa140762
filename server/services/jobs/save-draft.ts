import type { Order } from '../../../shared/api/orders.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { File } from '../../models/jobs/file.ts'
import { Job } from '../../models/jobs/job.ts'
import { Message } from '../../models/jobs/message.ts'
import { mustBeCurrent } from '../../models/load.ts'
import { loadDraft } from './load-draft.ts'
import { columnsOf, orderTerms } from './order-terms.ts'
import { jobView } from './view/job-view.ts'

/** Keeps the order as it is typed, faults and all; they are refused when it is paid for. */
export async function saveDraft(jobId: string, { version, order }: { version: number; order: Order }, caller: Caller) {
  await inTransaction(caller, async (tx) => {
    const job = await loadDraft(jobId, 'change', caller, tx)
    mustBeCurrent(job, version, 'This draft')
    const columns = columnsOf(order, await orderTerms(job.customerId, tx))
    await Job.update({ ...columns, version: job.version + 1 }, { where: { id: job.id }, transaction: tx })
    if (columns.siteId !== job.siteId) await moveToSite(job.id, columns.siteId, tx)
    tx.record({ type: 'job.order-changed', id: job.id, jobId: job.id, customerId: job.customerId, siteId: columns.siteId, data: { version: job.version + 1, samples: order.samples.length } })
  })
  return jobView(jobId, caller)
}

/** What hangs on a draft goes with it, so that the people of the new site may see it. */
export async function moveToSite(jobId: string, siteId: string, tx: Tx): Promise<void> {
  await File.update({ siteId }, { where: { jobId }, transaction: tx })
  await Message.update({ siteId }, { where: { jobId }, transaction: tx })
}
