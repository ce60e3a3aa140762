import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { outside } from '../../integrations/outside.ts'
import { File } from '../../models/jobs/file.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'

/** Takes an attachment off a draft. Once the job is placed, what was attached stays with it. */
export async function removeFile(fileId: string, caller: Caller) {
  const keys = await inTransaction(caller, async (tx) => {
    const { jobId } = await loadOne(File, 'File', fileId, caller, { tx })
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
    const file = await loadOne(File, 'File', fileId, caller, { tx, lock: true })
    const { customerId, siteId, storeKey, displayKey, removedAt } = file
    if (removedAt) throw new Problem('not-found', 'there is no such file')
    must(caller, 'create', 'File', { customerId, siteId })
    if (job.state !== 'draft' || file.purpose !== 'attachment') throw new Problem('not-now', `job ${job.number} is ${job.state}; files stay with it once it is placed`)
    await File.update({ removedAt: new Date() }, { where: { id: fileId }, transaction: tx })
    tx.record({ type: 'file.removed', id: fileId, jobId, customerId, siteId, data: { text: file.name }, touches: [{ subject: 'Job', id: jobId }] })
    return displayKey ? [storeKey, displayKey] : [storeKey]
  })
  // after commit: content that cannot be removed now costs room, not truth
  await Promise.allSettled(keys.map((key) => outside().files.remove(key)))
  return { removed: true as const }
}
