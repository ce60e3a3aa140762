import type { Caller } from '../../../caller.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { Job } from '../../../models/jobs/job.ts'
import { Message } from '../../../models/jobs/message.ts'
import { loadOne, must } from '../../../models/load.ts'
import { jobView } from '../view/job-view.ts'

/** Says something about a job to the other side; both keep it. */
export async function writeMessage(jobId: string, text: string, caller: Caller) {
  await inTransaction(caller, async (tx) => {
    const { customerId, siteId } = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    must(caller, 'create', 'Message', { customerId, siteId })
    const message = await Message.create({ jobId, customerId, siteId, byId: caller.person.id, text }, { transaction: tx })
    tx.record({ type: 'message.written', id: message.id, jobId, customerId, siteId, data: { messageId: message.id }, touches: [{ subject: 'Job', id: jobId }] })
  })
  return jobView(jobId, caller)
}
