import type { Sample as SampleView } from '../../../shared/api/samples.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne, must } from '../../models/load.ts'
import { sampleView } from './sample-view.ts'
import { touchesOf } from './touches-of.ts'

/** Ends a step of preparation. A second click finds it done and changes nothing. */
export async function finishStep(stepId: string, { remark }: { remark: string }, caller: Caller): Promise<SampleView> {
  const sampleId = await inTransaction(caller, async (tx) => {
    const step = await loadOne(Step, 'Step', stepId, caller, { tx, lock: true })
    must(caller, 'prepare', 'Step', step)
    if (step.type === 'measure' || step.type === 'pull') throw new Problem('not-now', 'a measurement ends by recording its run')
    if (step.state === 'done') return step.sampleId
    if (step.state !== 'started') throw new Problem('not-now', `${step.label} has not begun`)
    const sample = (await Sample.findByPk(step.sampleId, { raw: true, transaction: tx }))!
    await Step.update({ state: 'done', endedAt: new Date(), remark }, { where: { id: step.id }, transaction: tx })
    if (step.testId) await Test.update({ state: 'ready' }, { where: { id: step.testId, state: 'waiting' }, transaction: tx })
    tx.record({ type: 'step.finished', id: step.id, jobId: step.jobId, customerId: sample.customerId, siteId: step.siteId, data: { label: step.label, sample: sample.number, remark }, touches: touchesOf(step, step.id) })
    return step.sampleId
  })
  return sampleView(sampleId, caller)
}
