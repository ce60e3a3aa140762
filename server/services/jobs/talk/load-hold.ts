import { Problem } from '../../../../shared/problems.ts'
import type { Caller } from '../../../caller.ts'
import type { Tx } from '../../../database/transaction.ts'
import { Hold } from '../../../models/jobs/hold.ts'
import { Job } from '../../../models/jobs/job.ts'
import { loadOne, must, mustBeCurrent } from '../../../models/load.ts'

/** A hold that is still open, with its job, both locked: the job first, as everywhere. */
export async function loadHold(holdId: string, seen: number, action: 'answer' | 'receive', caller: Caller, tx: Tx): Promise<{ hold: Hold; job: Job }> {
  const { jobId } = await loadOne(Hold, 'Hold', holdId, caller, { tx })
  const job = await loadOne(Job, 'Job', jobId, caller, { tx, lock: true })
  const hold = await loadOne(Hold, 'Hold', holdId, caller, { tx, lock: true })
  must(caller, action, 'Hold', hold)
  mustBeCurrent(hold, seen, 'This hold')
  if (hold.releasedAt) throw new Problem('not-now', 'this hold was released already')
  return { hold, job }
}
