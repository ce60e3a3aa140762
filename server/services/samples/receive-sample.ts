import { Op } from 'sequelize'
import type { Sample as SampleView } from '../../../shared/api/samples.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { placeHold } from './place-hold.ts'
import { sampleView } from './sample-view.ts'
import { touchesOf } from './touches-of.ts'

type Said = { version: number; condition: string; mismatch: { reason: string; question: string; answers: string[] } | null }

/** Takes a sample in with its condition. One that does not match the order goes on hold with a question to the customer. */
export async function receiveSample(sampleId: string, { version, condition, mismatch }: Said, caller: Caller): Promise<SampleView> {
  await inTransaction(caller, async (tx) => {
    const sample = await loadOne(Sample, 'Sample', sampleId, caller, { tx, lock: true })
    must(caller, 'receive', 'Sample', sample)
    if (sample.state !== 'expected' && sample.state !== 'missing') throw new Problem('not-now', `sample ${sample.number} is ${sample.state} already`)
    mustBeCurrent(sample, version, 'This sample')
    const job = (await Job.findByPk(sample.jobId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
    if (job.state === 'cancelled' || job.state === 'draft') throw new Problem('not-now', `job ${job.number} is ${job.state}`)
    await Sample.update({ state: 'received', condition, receivedAt: new Date(), receivedById: caller.person.id, version: sample.version + 1 }, { where: { id: sample.id }, transaction: tx })
    await Job.update({ state: 'in work' }, { where: { id: job.id, state: { [Op.in]: ['placed', 'awaiting samples'] } }, transaction: tx })
    tx.record({ type: 'sample.received', id: sample.id, jobId: sample.jobId, customerId: sample.customerId, siteId: sample.siteId, data: { number: sample.number, condition }, touches: [...touchesOf({ jobId: sample.jobId, sampleId }), { subject: 'PlanEntry', id: sampleId }] })
    if (mismatch) await placeHold({ ...mismatch, sample }, caller, tx)
  })
  return sampleView(sampleId, caller)
}
