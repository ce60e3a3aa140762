import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { Hold } from '../../models/jobs/hold.ts'
import { Job } from '../../models/jobs/job.ts'
import { Message } from '../../models/jobs/message.ts'
import { Sample } from '../../models/jobs/sample.ts'

/** Stops a sample with a reason and a question to the customer, which also stands among the job's messages. */
export async function placeHold({ sample, reason, question, answers }: { sample: Sample; reason: string; question: string; answers: string[] }, caller: Caller, tx: Tx): Promise<void> {
  const { jobId, customerId, siteId } = sample
  const hold = await Hold.create({ jobId, sampleId: sample.id, customerId, siteId, reason, question, answers, placedById: caller.person.id }, { transaction: tx })
  await Sample.update({ onHold: true }, { where: { id: sample.id }, transaction: tx })
  await Job.increment({ holds: 1, version: 1 }, { where: { id: jobId }, transaction: tx })
  await Message.create({ jobId, customerId, siteId, byId: caller.person.id, text: `Sample ${sample.number} cannot go on: ${reason} ${question}`.trim() }, { transaction: tx })
  tx.record({ type: 'hold.placed', id: hold.get('id'), jobId, customerId, siteId, data: { sampleNumber: sample.number, reason, question }, touches: [{ subject: 'Job', id: jobId }, { subject: 'Sample', id: sample.id }] })
}
