import { Problem } from '../../../../shared/problems.ts'
import type { Caller } from '../../../caller.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { Hold } from '../../../models/jobs/hold.ts'
import { jobView } from '../view/job-view.ts'
import { loadHold } from './load-hold.ts'

/** The customer's answer to the question of a hold; the lab releases it when the answer will do. */
export async function answerHold(holdId: string, { version, answer }: { version: number; answer: string }, caller: Caller) {
  const jobId = await inTransaction(caller, async (tx) => {
    const { hold, job } = await loadHold(holdId, version, 'answer', caller, tx)
    if (hold.answer !== null) throw new Problem('not-now', 'this hold is answered; write a message to add to it')
    await Hold.update({ answer, answeredAt: new Date(), answeredById: caller.person.id, version: hold.version + 1 }, { where: { id: holdId }, transaction: tx })
    tx.record({ type: 'hold.answered', id: holdId, jobId: job.id, customerId: hold.customerId, siteId: hold.siteId, data: { sampleId: hold.sampleId, text: answer }, touches: [{ subject: 'Job', id: job.id }, { subject: 'Sample', id: hold.sampleId ?? job.id }] })
    return job.id
  })
  return jobView(jobId, caller)
}
