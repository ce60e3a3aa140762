import { describe, expect, it } from 'vitest'
import { PlanEntry } from '../../server/models/jobs/plan-entry.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Bench } from '../../server/models/sites/bench.ts'
import { finishStep } from '../../server/services/samples/finish-step.ts'
import { startStep } from '../../server/services/samples/start-step.ts'
import { planSite } from '../../server/services/planning/plan-site.ts'
import type { Floor } from '../../shared/api/benches.ts'
import { startTestApp } from '../support/app.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { buildArrived, buildLab, buildWork, type Lab } from '../support/build/runs.ts'
import { callerFor } from '../support/caller.ts'

const app = await startTestApp()
const plan = ({ site }: Lab) => planSite(site.id, {}, { person: null, requestId: 'test' })

async function start() {
  const lab = await buildLab()
  const agent = await app.agentFor(lab.manager)
  return { lab, agent, floor: async (query: object = {}) => (await agent.get('/api/floor').query({ days: 10, ...query }).expect(200)).body as Floor }
}

describe('the floor', () => {
  it('shows benches against working days, with what is open and what is held', async () => {
    const { lab, floor } = await start()
    await buildWork(lab, buildOrder({}, { count: 3 }))
    const empty = await floor()
    expect(empty).toMatchObject({ madeAt: null, strips: [], unplaced: [] })
    expect(empty.days).toHaveLength(10)
    expect(empty.sites.map(({ id, benches }) => [id, benches.map((bench) => bench.id).sort()])).toEqual([[lab.site.id, [lab.cutting.id, lab.hardness.id].sort()]])
    for (const { open, openMinutes, heldMinutes } of empty.sites[0]!.benches) {
      expect(openMinutes).toBe(open.reduce((sum, { start: from, end }) => sum + (Date.parse(end) - Date.parse(from)) / 60_000, 0))
      expect(heldMinutes).toBe(0)
    }
    await plan(lab)
    const full = await floor()
    expect(full.madeAt).not.toBeNull()
    // a section takes 10 + 5 minutes, Rockwell 5 + 6
    const held = (id: string) => full.sites[0]!.benches.find((bench) => bench.id === id)!.heldMinutes
    expect([held(lab.cutting.id), held(lab.hardness.id)]).toEqual([45, 33])
  })

  it('draws neighbouring steps of one job on one bench as one strip', async () => {
    const { lab, floor } = await start()
    const { job, steps, samples } = await buildWork(lab, buildOrder({}, { count: 3 }))
    await plan(lab)
    const { strips } = await floor()
    expect(strips.flatMap(({ stepIds }) => stepIds).sort()).toEqual(steps.map(({ id }) => id).sort())
    const cut = strips.filter(({ benchId }) => benchId === lab.cutting.id)
    expect(cut).toHaveLength(1)
    expect(cut[0]).toMatchObject({ jobId: job.id, jobNumber: job.number, label: 'section', state: 'planned', stage: 'awaiting samples', person: expect.any(String) })
    expect(cut[0]!.sampleNumbers.sort()).toEqual(samples.map(({ number }) => number).sort())
    expect(Date.parse(cut[0]!.end) - Date.parse(cut[0]!.start)).toBe(45 * 60_000)
  })

  it('tells what has no place, why, and what would cure it', async () => {
    const { lab, floor } = await start()
    const { job, samples: [sample] } = await buildWork(lab)
    await Bench.update({ out: true }, { where: { id: lab.hardness.id } })
    await plan(lab)
    const { unplaced, strips, sites } = await floor()
    expect(unplaced).toMatchObject([{ jobId: job.id, jobNumber: job.number, sampleNumber: sample!.number, label: 'measure HRC', because: expect.stringMatching(/\w/) }])
    expect(unplaced[0]!.cures.length).toBeGreaterThan(0)
    expect(strips.map(({ benchId }) => benchId)).toEqual([lab.cutting.id])
    expect(sites[0]!.benches.find(({ id }) => id === lab.hardness.id)).toMatchObject({ out: true })
  })

  it('tells running from done, and keeps what runs on since yesterday', async () => {
    const { lab, floor } = await start()
    const technician = await callerFor(lab.technician)
    const { steps } = await buildArrived(lab, buildOrder({}, { count: 2 }))
    const [first, second] = steps.filter(({ capability }) => capability === 'section')
    await plan(lab)
    await startStep(first!.id, lab.cutting.id, technician)
    await finishStep(first!.id, { remark: '' }, technician)
    await startStep(second!.id, lab.cutting.id, technician)
    const stripOf = async (id: string) => (await floor()).strips.find(({ stepIds }) => stepIds.includes(id))
    expect(await stripOf(first!.id)).toMatchObject({ state: 'done', stage: 'in work', person: lab.technician.name })
    expect(await stripOf(second!.id)).toMatchObject({ state: 'started', stage: 'in work' })
    const days = 3 * 24 * 3600_000
    await Step.update({ startedAt: new Date(Date.now() - days) }, { where: { id: second!.id } })
    await PlanEntry.update({ startsAt: new Date(Date.now() - days), endsAt: new Date(Date.now() - days + 900_000) }, { where: { stepId: second!.id } })
    const running = await stripOf(second!.id)
    expect(running).toMatchObject({ state: 'started' })
    expect(Date.parse(running!.end)).toBeGreaterThan(Date.now() - 60_000)
    await PlanEntry.destroy({ where: { stepId: second!.id } })
    expect(await stripOf(second!.id)).toMatchObject({ state: 'started' })
  })

  it('is the manager\'s, of their own sites', async () => {
    const { lab, floor } = await start()
    const other = await buildLab()
    await buildWork(other)
    await plan(other)
    expect((await floor()).strips).toEqual([])
    expect(await floor({ siteId: other.site.id })).toMatchObject({ sites: [], strips: [], unplaced: [] })
    await (await app.agentFor(lab.technician)).get('/api/floor').expect(403)
    await (await app.agentFor(lab.client)).get('/api/floor').expect(403)
  })
})
