import type { Sample as SampleView } from '../../../shared/api/samples.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { placeHold } from './place-hold.ts'
import { sampleView } from './sample-view.ts'
import { touchesOf } from './touches-of.ts'

/** A sample that did not come with its parcel goes on hold, and the customer is asked. */
export async function reportMissing(sampleId: string, { version, remark }: { version: number; remark: string }, caller: Caller): Promise<SampleView> {
  await inTransaction(caller, async (tx) => {
    const sample = await loadOne(Sample, 'Sample', sampleId, caller, { tx, lock: true })
    must(caller, 'receive', 'Sample', sample)
    if (sample.state !== 'expected') throw new Problem('not-now', `sample ${sample.number} is ${sample.state} already`)
    mustBeCurrent(sample, version, 'This sample')
    await Sample.update({ state: 'missing', version: sample.version + 1 }, { where: { id: sample.id }, transaction: tx })
    tx.record({ type: 'sample.missing', id: sample.id, jobId: sample.jobId, customerId: sample.customerId, siteId: sample.siteId, data: { number: sample.number, remark }, touches: [...touchesOf({ jobId: sample.jobId, sampleId }), { subject: 'PlanEntry', id: sampleId }] })
    await placeHold({ sample, reason: `it was not in the parcel.${remark ? ` ${remark}` : ''}`, question: 'When does it come, or do we go on without it?', answers: ['It follows', 'Go on without it'] }, caller, tx)
  })
  return sampleView(sampleId, caller)
}
