import { Op } from 'sequelize'
import type { Sample as SampleView } from '../../../shared/api/samples.ts'
import { benchRefuses } from '../../../shared/planning/bench-refuses.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { loadOne, must } from '../../models/load.ts'
import { Bench } from '../../models/sites/bench.ts'
import { sampleView } from './sample-view.ts'
import { touchesOf } from './touches-of.ts'

/** Begins a step of preparation at a bench. A measurement begins by opening its run. */
export async function startStep(stepId: string, benchId: string, caller: Caller): Promise<SampleView> {
  const sampleId = await inTransaction(caller, async (tx) => {
    const step = await loadOne(Step, 'Step', stepId, caller, { tx, lock: true })
    must(caller, 'prepare', 'Step', step)
    if (step.type === 'measure' || step.type === 'pull') throw new Problem('not-now', 'a measurement begins on its sheet')
    if (step.state === 'started' && step.startedById === caller.person.id) return step.sampleId
    if (step.state !== 'to come' && step.state !== 'planned') throw new Problem('not-now', `${step.label} is ${step.state} already`)
    const bench = await loadOne(Bench, 'Bench', benchId, caller, { tx })
    const refused = bench.siteId === step.siteId ? benchRefuses(bench.does, step.need) : 'is at another site'
    if (refused) throw new Problem('not-acceptable', `${bench.name} ${refused}`, { benchId: refused })
    if (bench.out) throw new Problem('not-now', `${bench.name} is out of use`)
    const sample = await readySample(step, tx)
    const now = new Date()
    await Step.update({ state: 'started', benchId, startedAt: now, startedById: caller.person.id }, { where: { id: step.id }, transaction: tx })
    await Sample.update({ state: 'in work' }, { where: { id: sample.id }, transaction: tx })
    await Job.update({ state: 'in work' }, { where: { id: step.jobId, state: { [Op.in]: ['placed', 'awaiting samples'] } }, transaction: tx })
    tx.record({ type: 'step.started', id: step.id, jobId: step.jobId, customerId: sample.customerId, siteId: step.siteId, data: { label: step.label, sample: sample.number, bench: bench.name }, touches: touchesOf(step, step.id) })
    return step.sampleId
  })
  return sampleView(sampleId, caller)
}

/** The step's sample, if it is here, not on hold, and everything this step builds on is done. */
async function readySample(step: Step, tx: Tx): Promise<Sample> {
  const sample = (await Sample.findByPk(step.sampleId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
  if (sample.onHold) throw new Problem('not-now', `sample ${sample.number} is on hold`)
  if (sample.state === 'expected' || sample.state === 'missing' || sample.state === 'void') throw new Problem('not-now', `sample ${sample.number} is ${sample.state === 'expected' ? 'not received yet' : sample.state}`)
  const before = await Step.findOne({
    where: { sampleId: step.sampleId, position: { [Op.lt]: step.position }, state: { [Op.notIn]: ['done', 'void'] }, testId: step.testId ? { [Op.or]: [step.testId, null] } : null },
    order: [['position', 'ASC']], raw: true, transaction: tx,
  })
  if (before) throw new Problem('not-now', `${before.label} has to be done first`)
  return sample
}
