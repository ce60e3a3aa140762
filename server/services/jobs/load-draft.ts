import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'

/** A draft that may still change, locked; refused once it is placed, and while its payment page is open. */
export async function loadDraft(jobId: string, action: 'change' | 'cancel', caller: Caller, tx: Tx): Promise<Job> {
  const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
  must(caller, action, 'Job', job)
  if (job.state !== 'draft') throw new Problem('not-now', `job ${job.number} is ${job.state}; only a draft can change`)
  if (job.waitsForPayment) throw new Problem('not-now', `the payment page of ${job.number} is open; close it before the order changes`)
  return job
}
