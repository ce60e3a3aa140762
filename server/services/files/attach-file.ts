import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'
import { fileView } from './file-view.ts'
import { keepUpload, type Belonging, type Receive } from './keep-upload.ts'

/** Attaches a drawing, purchase order or specification to a job; customer and lab both see it. */
export async function attachFile(jobId: string, receive: Receive, caller: Caller) {
  const belong = async (tx?: Tx): Promise<Belonging> => {
    const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: tx !== undefined })
    const { customerId, siteId } = job
    must(caller, 'create', 'File', { customerId, siteId })
    if (job.state === 'closed' || job.state === 'cancelled') throw new Problem('not-now', `job ${job.number} is ${job.state}; nothing can be added to it`)
    return { jobId, customerId, siteId, purpose: 'attachment', visibleToCustomer: true }
  }
  await belong()
  return fileView(await keepUpload(receive, belong, caller))
}
