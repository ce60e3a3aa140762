import { Op } from 'sequelize'
import type { Caller } from '../../../caller.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { Hold } from '../../../models/jobs/hold.ts'
import { Job } from '../../../models/jobs/job.ts'
import { Message } from '../../../models/jobs/message.ts'
import { Sample } from '../../../models/jobs/sample.ts'
import { jobView } from '../view/job-view.ts'
import { loadHold } from './load-hold.ts'

/** Lets a sample or a job go on. A remark is written to the customer as a message. */
export async function releaseHold(holdId: string, { version, remark }: { version: number; remark: string }, caller: Caller) {
  const jobId = await inTransaction(caller, async (tx) => {
    const { hold, job } = await loadHold(holdId, version, 'receive', caller, tx)
    const { customerId, siteId, sampleId } = hold
    await Hold.update({ releasedAt: new Date(), version: hold.version + 1 }, { where: { id: holdId }, transaction: tx })
    await Job.update({ holds: Math.max(0, job.holds - 1), version: job.version + 1 }, { where: { id: job.id }, transaction: tx })
    if (sampleId && (await Hold.count({ where: { sampleId, releasedAt: null, id: { [Op.ne]: holdId } }, transaction: tx })) === 0) {
      await Sample.increment('version', { where: { id: sampleId }, transaction: tx })
      await Sample.update({ onHold: false }, { where: { id: sampleId }, transaction: tx })
    }
    const about = { jobId: job.id, customerId, siteId }
    if (remark) {
      const message = await Message.create({ ...about, byId: caller.person.id, text: remark }, { transaction: tx })
      tx.record({ type: 'message.written', id: message.id, ...about, data: { messageId: message.id }, touches: [{ subject: 'Job', id: job.id }] })
    }
    tx.record({ type: 'hold.released', id: holdId, ...about, data: { sampleId, text: remark }, touches: [{ subject: 'Job', id: job.id }, { subject: 'Sample', id: sampleId ?? job.id }] })
    return job.id
  })
  return jobView(jobId, caller)
}
