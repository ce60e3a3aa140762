import { describe, expect, it } from 'vitest'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { finishStep } from '../../server/services/samples/finish-step.ts'
import { startStep } from '../../server/services/samples/start-step.ts'
import { planSite } from '../../server/services/planning/plan-site.ts'
import { startRun } from '../../server/services/test-runs/start-run.ts'
import { reviewRun } from '../../server/services/test-runs/review-run.ts'
import { startTestApp } from '../support/app.ts'
import { buildVerification } from '../support/build/benches.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { buildArrived, buildLab, buildRecordedRun, buildWork, type Lab } from '../support/build/runs.ts'
import { callerFor } from '../support/caller.ts'

const app = await startTestApp()
const plan = ({ site }: Lab) => planSite(site.id, {}, { person: null, requestId: 'test' })
type Item = { stepId: string; sampleNumber: string; note: string; state: string; plannedStart: string; runId: string | null; testId: string | null; methodId: string | null; label: string; isHere: boolean; onHold: boolean }

async function start() {
  const lab = await buildLab()
  const agent = await app.agentFor(lab.technician)
  const queue = async (benchId: string) => (await agent.get(`/api/benches/${benchId}/queue`).expect(200)).body as { items: Item[]; doneToday: number; lastDoneAt: string | null; timeZone: string; bench: { id: string } }
  return { lab, agent, queue, technician: await callerFor(lab.technician) }
}

describe('the queue of a bench', () => {
  it('has what is planned there, in the order of the plan, the running first', async () => {
    const { lab, queue, technician } = await start()
    const { steps } = await buildArrived(lab, buildOrder({}, { count: 3 }))
    await plan(lab)
    const before = await queue(lab.cutting.id)
    expect(before).toMatchObject({ bench: { id: lab.cutting.id }, timeZone: 'Europe/London', doneToday: 0, lastDoneAt: null })
    expect(before.items.map(({ stepId }) => stepId).sort()).toEqual(steps.filter(({ capability }) => capability === 'section').map(({ id }) => id).sort())
    const starts = before.items.map(({ plannedStart }) => plannedStart)
    expect(starts).toEqual([...starts].sort())
    expect(new Set(starts).size).toBe(3)
    expect(before.items[0]).toMatchObject({ state: 'planned', label: 'section', testId: null, methodId: null, isHere: true, onHold: false, note: '' })
    const last = before.items[2]!
    await startStep(last.stepId, lab.cutting.id, technician)
    expect((await queue(lab.cutting.id)).items[0]).toMatchObject({ stepId: last.stepId, state: 'started', note: '' })
    await finishStep(last.stepId, { remark: '' }, technician)
    const after = await queue(lab.cutting.id)
    expect(after).toMatchObject({ doneToday: 1, lastDoneAt: expect.any(String) })
    expect(after.items.map(({ stepId }) => stepId)).toEqual(before.items.slice(0, 2).map(({ stepId }) => stepId))
  })

  it('says the one thing that stands in the way', async () => {
    const { lab, queue, technician } = await start()
    const { steps, samples: [sample] } = await buildWork(lab)
    await plan(lab)
    const note = async () => (await queue(lab.hardness.id)).items.map((item) => item.note)
    expect(await note()).toEqual(['sample not here yet'])
    await Sample.update({ state: 'received', receivedAt: new Date() }, { where: { id: sample!.id } })
    expect(await note()).toEqual(['section first'])
    await startStep(steps[0]!.id, lab.cutting.id, technician)
    await finishStep(steps[0]!.id, { remark: '' }, technician)
    expect(await note()).toEqual([''])
    await Sample.update({ onHold: true }, { where: { id: sample!.id } })
    expect(await note()).toEqual(['on hold'])
  })

  it('names the test and its open run where it measures', async () => {
    const { lab, queue, technician } = await start()
    const { tests: [test], steps } = await buildArrived(lab)
    await startStep(steps[0]!.id, lab.cutting.id, technician)
    await finishStep(steps[0]!.id, { remark: '' }, technician)
    await plan(lab)
    expect((await queue(lab.hardness.id)).items).toMatchObject([{ testId: test!.id, methodId: 'rockwell', label: 'Rockwell HRC', runId: null, state: 'planned' }])
    const run = await startRun(test!.id, lab.hardness.id, technician)
    expect((await queue(lab.hardness.id)).items).toMatchObject([{ runId: run.id, state: 'started' }])
  })

  it('has again what review sent back, and says so', async () => {
    const { lab, queue } = await start()
    const { run } = await buildRecordedRun(lab)
    expect((await queue(lab.hardness.id)).items).toEqual([])
    await reviewRun(run.id, { version: run.version, outcome: 'sent back', remark: 'scratch', readings: [] }, await callerFor(lab.reviewer))
    await plan(lab)
    expect((await queue(lab.hardness.id)).items).toMatchObject([{ note: 'sent back by review', runId: null, state: 'planned' }])
  })

  it('shows no step that is done, void or without a place', async () => {
    const { lab, queue } = await start()
    const { steps } = await buildArrived(lab)
    await plan(lab)
    await Step.update({ state: 'void' }, { where: { id: steps[0]!.id } })
    expect((await queue(lab.cutting.id)).items).toEqual([])
  })
})

describe('benches and machines', () => {
  it('are those of one\'s own sites, with their newest verification', async () => {
    const { lab, agent } = await start()
    await buildVerification(lab.machine, { passed: false, at: new Date(Date.now() - 60_000) })
    const { body } = await agent.get('/api/benches').expect(200)
    expect(body.items.map(({ id }: { id: string }) => id).sort()).toEqual([lab.cutting.id, lab.hardness.id].sort())
    const hardness = body.items.find(({ id }: { id: string }) => id === lab.hardness.id)
    expect(hardness).toMatchObject({ siteName: lab.site.name, equipment: { code: lab.machine.code, calibratedUntil: '2099-12-31', lastVerification: { passed: false } } })
    expect((await agent.get('/api/equipment').expect(200)).body.items).toMatchObject([{ id: lab.machine.id, lastVerification: { passed: false, text: 'block 62.1 HRC read as 63.4 HRC' } }])
    const stranger = await app.agentFor((await buildLab()).technician)
    await stranger.get(`/api/benches/${lab.hardness.id}/queue`).expect(404)
    await (await app.agentFor(lab.client)).get('/api/benches').expect(403)
  })
})
