import { Op } from 'sequelize'
import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { benchRefuses } from '../../../shared/planning/bench-refuses.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { loadOne, must } from '../../models/load.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import { Site } from '../../models/sites/site.ts'
import { latestVerifications } from '../equipment/latest-verifications.ts'
import { dayIn } from '../jobs/day-in.ts'
import { touchesOf } from '../samples/touches-of.ts'
import { authorisedUntil } from './authorised-until.ts'
import { runView } from './run-view.ts'

/** Opens a run of a test at a bench, or gives back the one that is open. */
export async function startRun(testId: string, benchId: string, caller: Caller): Promise<TestRunView> {
  const id = await inTransaction(caller, async (tx) => {
    const test = await loadOne(Test, 'Test', testId, caller, { tx, lock: true })
    must(caller, 'record', 'TestRun', { siteId: test.siteId })
    const open = await TestRun.findOne({ where: { testId, state: 'open' }, raw: true, transaction: tx })
    if (open) return open.id
    if (test.state !== 'waiting' && test.state !== 'ready') throw new Problem('not-now', `this test is ${test.state}`)
    const bench = await loadOne(Bench, 'Bench', benchId, caller, { tx })
    const site = (await Site.findByPk(test.siteId, { raw: true, transaction: tx }))!
    await mustBeUsable(bench, test, site, tx)
    const until = await authorisedUntil(caller.person.id, test.methodId, 'carry out', site.timeZone, tx)
    if (!until) throw new Problem('not-allowed', `You are not authorised to carry out ${methodOf(test.methodId)?.title ?? test.methodId}, or the authorisation has ended.`)
    const sample = (await Sample.findByPk(test.sampleId, { raw: true, transaction: tx, lock: tx.LOCK.UPDATE }))!
    if (sample.onHold) throw new Problem('not-now', `sample ${sample.number} is on hold`)
    if (sample.state === 'expected' || sample.state === 'missing' || sample.state === 'void') throw new Problem('not-now', `sample ${sample.number} is ${sample.state === 'expected' ? 'not received yet' : sample.state}`)
    const step = await nextMeasure(test, tx)
    const refused = benchRefuses(bench.does, step.need)
    if (refused) throw new Problem('not-acceptable', `${bench.name} ${refused}`, { benchId: refused })

    const number = (await TestRun.count({ where: { testId }, transaction: tx })) + 1
    const now = new Date()
    const run = await TestRun.create({
      testId, sampleId: test.sampleId, jobId: test.jobId, stepId: step.id, siteId: test.siteId, benchId, equipmentId: bench.equipmentId, performedById: caller.person.id, number,
      methodId: test.methodId, methodVersion: test.methodVersion, state: 'open', startedAt: now,
    }, { transaction: tx })
    await Test.update({ state: 'in run', version: test.version + 1 }, { where: { id: test.id }, transaction: tx })
    await Step.update({ state: 'started', benchId, startedAt: now, startedById: caller.person.id, endedAt: null }, { where: { id: step.id }, transaction: tx })
    await Sample.update({ state: 'in work' }, { where: { id: sample.id }, transaction: tx })
    await Job.update({ state: 'in work' }, { where: { id: test.jobId, state: { [Op.in]: ['placed', 'awaiting samples', 'in review'] } }, transaction: tx })
    tx.record({ type: 'test-run.started', id: run.id, jobId: test.jobId, customerId: test.customerId, siteId: test.siteId, data: { testId, benchId, number }, touches: touchesOf(test, step.id) })
    return run.id
  })
  return runView(await loadOne(TestRun, 'TestRun', id, caller), caller)
}

async function mustBeUsable(bench: Bench, test: Test, site: Site, tx: Tx): Promise<void> {
  if (bench.siteId !== test.siteId) throw new Problem('not-acceptable', `${bench.name} is at another site`, { benchId: 'is at another site' })
  if (bench.out) throw new Problem('not-now', `${bench.name} is out of use`)
  if (!bench.equipmentId) return
  const machine = (await Equipment.findByPk(bench.equipmentId, { raw: true, transaction: tx }))!
  if (machine.outOfUse) throw new Problem('not-now', `${machine.code} is out of use`)
  if (machine.calibratedUntil && machine.calibratedUntil < dayIn(site.timeZone, new Date())) throw new Problem('not-now', `the calibration of ${machine.code} ended on ${machine.calibratedUntil}`)
  const verified = (await latestVerifications([machine.id], tx)).get(machine.id)
  if (verified?.passed === false) throw new Problem('not-now', `${machine.code} failed its verification: ${verified.text}`)
}

/** The measuring step of a test, once the steps that prepare for it are done. */
async function nextMeasure(test: Test, tx: Tx): Promise<Step> {
  const steps = await Step.findAll({ where: { sampleId: test.sampleId, state: { [Op.ne]: 'void' } }, order: [['position', 'ASC']], raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
  const measure = steps.find((step) => step.testId === test.id && step.capability === test.methodId)
  if (!measure) throw new Problem('not-now', 'the traveller of this sample has no step for this test')
  const before = steps.find((step) => step.position < measure.position && (step.testId === test.id || step.testId === null) && step.state !== 'done')
  if (before) throw new Problem('not-now', `${before.label} has to be done first`)
  return measure
}
