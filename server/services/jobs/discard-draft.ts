import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { Payment } from '../../models/billing/payment.ts'
import { File } from '../../models/jobs/file.ts'
import { Job } from '../../models/jobs/job.ts'
import { Message } from '../../models/jobs/message.ts'
import { mustBeCurrent } from '../../models/load.ts'
import { loadDraft } from './load-draft.ts'

/** Throws a draft away with its files. One that was written about or sent for payment stays on record as cancelled. */
export async function discardDraft(jobId: string, version: number, caller: Caller) {
  const keys = await inTransaction(caller, async (tx) => {
    const job = await loadDraft(jobId, 'cancel', caller, tx)
    mustBeCurrent(job, version, 'This draft')
    const where = { jobId }
    const remembered = (await Payment.count({ where, transaction: tx })) + (await Message.count({ where, transaction: tx })) > 0
    const files = remembered ? [] : await File.findAll({ where, raw: true, transaction: tx })
    if (remembered) {
      await Job.update({ state: 'cancelled', version: job.version + 1 }, { where: { id: jobId }, transaction: tx })
    } else {
      await File.destroy({ where, transaction: tx })
      await Job.destroy({ where: { id: jobId }, transaction: tx })
    }
    tx.record({ type: 'job.discarded', id: jobId, jobId, customerId: job.customerId, siteId: job.siteId, data: { number: job.number } })
    return files.flatMap(({ storeKey, displayKey }) => (displayKey ? [storeKey, displayKey] : [storeKey]))
  })
  // after commit: content that cannot be removed now costs room, not truth
  await Promise.allSettled(keys.map((key) => outside().files.remove(key)))
  return { discarded: true as const }
}
