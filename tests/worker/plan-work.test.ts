import { describe, expect, it } from 'vitest'
import { PlanEntry } from '../../server/models/jobs/plan-entry.ts'
import { Plan } from '../../server/models/jobs/plan.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { receiveSample } from '../../server/services/samples/receive-sample.ts'
import { startStep } from '../../server/services/samples/start-step.ts'
import { planWork } from '../../worker/tasks/plan-work.ts'
import { buildLab, buildWork, type Lab } from '../support/build/runs.ts'
import { callerFor } from '../support/caller.ts'
import { startTestApp } from '../support/app.ts'
import { runAtOnce, runTask, runTwice } from '../support/task.ts'

await startTestApp()

const stateOf = async ({ site }: Lab) => ({
  entries: await PlanEntry.findAll({ where: { siteId: site.id }, order: [['stepId', 'ASC']], raw: true }),
  steps: await Step.findAll({ where: { siteId: site.id }, order: [['id', 'ASC']], raw: true }),
  jobs: await Job.findAll({ where: { siteId: site.id }, order: [['id', 'ASC']], raw: true }),
  plan: await Plan.findOne({ where: { siteId: site.id }, raw: true }),
})

describe('planning work after what happened', () => {
  it('leaves the same state when it runs twice for one event', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab)
    await runTwice(planWork, 'job.placed', () => stateOf(lab))
    expect((await stateOf(lab)).entries).toHaveLength(steps.length)
  })

  it('is harmless when two workers do it at once', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab)
    expect((await runAtOnce(planWork, 'job.placed')).map(({ status }) => status)).toEqual(['fulfilled', 'fulfilled'])
    expect((await stateOf(lab)).entries).toHaveLength(steps.length)
  })

  it('follows the sample in and the step begun', async () => {
    const lab = await buildLab()
    const { samples: [sample], steps: [cut] } = await buildWork(lab)
    await runTask(planWork, 'job.placed')
    const expected = (await stateOf(lab)).entries.find(({ stepId }) => stepId === cut!.id)!
    const technician = await callerFor(lab.technician)
    await receiveSample(sample!.id, { version: sample!.version, condition: 'dry', mismatch: null }, technician)
    await runTask(planWork, 'sample.received')
    // it need not wait for the parcel of tomorrow any more
    const arrived = (await stateOf(lab)).entries.find(({ stepId }) => stepId === cut!.id)!
    expect(arrived.startsAt!.getTime()).toBeLessThanOrEqual(expected.startsAt!.getTime())
    await startStep(cut!.id, lab.cutting.id, technician)
    await runTwice(planWork, 'step.started', () => stateOf(lab))
    expect((await stateOf(lab)).entries.find(({ stepId }) => stepId === cut!.id)).toMatchObject({ benchId: lab.cutting.id, personId: lab.technician.id })
  })

  it('asks for nothing that its events do not say', () => {
    expect(() => planWork.run({ eventId: 1, subjectId: 'x' }, undefined as never)).toThrow(/siteId/)
  })
})
