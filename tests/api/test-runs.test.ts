import { randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { Job } from '../../server/models/jobs/job.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Test } from '../../server/models/jobs/test.ts'
import { Authorisation } from '../../server/models/people/authorisation.ts'
import { Bench } from '../../server/models/sites/bench.ts'
import { Equipment } from '../../server/models/sites/equipment.ts'
import { TestRun } from '../../server/models/runs/test-run.ts'
import { startTestApp } from '../support/app.ts'
import { buildBench, buildRight, buildVerification, hardnessAbility } from '../support/build/benches.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { buildPerson } from '../support/build/people.ts'
import { buildArrived, buildLab, buildReady, buildWork, type Lab } from '../support/build/runs.ts'
import { buildSite } from '../support/build/sites.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

const start = async (agent: Awaited<ReturnType<typeof app.agentFor>>, testId: string, { hardness }: Pick<Lab, 'hardness'>) => agent.post(`/api/tests/${testId}/runs`).send({ benchId: hardness.id })

async function lab() {
  const built = await buildLab()
  return { ...built, agent: await app.agentFor(built.technician) }
}

describe('starting a run', () => {
  it('opens it at the bench with its machine and moves test, step, sample and job', async () => {
    const here = await lab()
    const { tests: [test], job, samples: [sample], steps } = await buildReady(here)
    const { body: run, status } = await start(here.agent, test!.id, here)
    expect(status).toBe(200)
    expect(run).toMatchObject({ state: 'open', number: 1, testId: test!.id, benchId: here.hardness.id, equipment: { id: here.machine.id }, performedById: here.technician.id, readings: [], evaluation: null, authorisedUntil: '2099-12-31' })
    expect(await Test.findByPk(test!.id, { raw: true })).toMatchObject({ state: 'in run' })
    expect(await Step.findByPk(steps[1]!.id, { raw: true })).toMatchObject({ state: 'started', benchId: here.hardness.id, startedById: here.technician.id })
    expect(await Sample.findByPk(sample!.id, { raw: true })).toMatchObject({ state: 'in work' })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in work' })
    expect((await eventsOf(run.id)).map(({ type, personId }) => [type, personId])).toEqual([['test-run.started', here.technician.id]])
  })

  it('gives the open run back on a second start, and opens one when two start at once', async () => {
    const here = await lab()
    const { tests: [test] } = await buildReady(here)
    const second = await app.agentFor(here.reviewer)
    const answers = await Promise.all([start(here.agent, test!.id, here), start(here.agent, test!.id, here), start(second, test!.id, here)])
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200])
    expect(new Set(answers.map(({ body }) => body.id)).size).toBe(1)
    expect(await TestRun.count({ where: { testId: test!.id } })).toBe(1)
  })

  it('is refused before the sample is here, on hold, or cut', async () => {
    const here = await lab()
    const { tests: [expected] } = await buildWork(here)
    const notHere = await start(here.agent, expected!.id, here)
    expect([notHere.status, notHere.body.code]).toEqual([409, 'not-now'])
    expect(notHere.body.detail).toMatch(/not received yet/)
    const { tests: [uncut], samples: [sample] } = await buildArrived(here)
    const first = await start(here.agent, uncut!.id, here)
    expect([first.status, first.body.detail]).toEqual([409, 'section has to be done first'])
    await Sample.update({ onHold: true }, { where: { id: sample!.id } })
    const held = await start(here.agent, uncut!.id, here)
    expect([held.status, held.body.detail]).toEqual([409, `sample ${sample!.number} is on hold`])
    expect(await TestRun.count({ where: { jobId: sample!.jobId } })).toBe(0)
  })

  it('is refused at a bench that does not do it, is out, or stands at another site', async () => {
    const here = await lab()
    const { tests: [test] } = await buildReady(here)
    const wrong = await start(here.agent, test!.id, { hardness: here.cutting })
    expect([wrong.status, wrong.body.fields]).toEqual([422, { benchId: expect.stringMatching(/^does not do /) }])
    const elsewhere = await start(here.agent, test!.id, { hardness: await buildBench((await buildSite()).id, [hardnessAbility]) })
    expect(elsewhere.status).toBe(404)
    await Bench.update({ out: true }, { where: { id: here.hardness.id } })
    const out = await start(here.agent, test!.id, here)
    expect([out.status, out.body.detail]).toEqual([409, `${here.hardness.name} is out of use`])
  })

  it('is refused on a machine that is out of use, out of calibration or failed its last verification', async () => {
    const here = await lab()
    const { tests: [test] } = await buildReady(here)
    const machine = { where: { id: here.machine.id } }
    await Equipment.update({ outOfUse: true }, machine)
    expect((await start(here.agent, test!.id, here)).body.detail).toBe(`${here.machine.code} is out of use`)
    await Equipment.update({ outOfUse: false, calibratedUntil: '2020-01-31' }, machine)
    expect((await start(here.agent, test!.id, here)).body.detail).toBe(`the calibration of ${here.machine.code} ended on 2020-01-31`)
    await Equipment.update({ calibratedUntil: '2099-12-31' }, machine)
    await buildVerification(here.machine, { passed: false })
    const failed = await start(here.agent, test!.id, here)
    expect([failed.status, failed.body.code]).toEqual([409, 'not-now'])
    expect(failed.body.detail).toMatch(/failed its verification: block 62.1 HRC/)
    await buildVerification(here.machine, { passed: true, at: new Date(Date.now() + 1000) })
    expect((await start(here.agent, test!.id, here)).status).toBe(200)
  })

  it('counts the last day of a calibration by the calendar of the site', async () => {
    const here = await lab()
    await here.agent.get('/api/session').expect(200)
    const { tests: [test] } = await buildReady(here)
    const dayAt = (timeZone: string) => new Intl.DateTimeFormat('en-CA', { timeZone }).format(new Date())
    // these two places never have the same date, so a comparison with the UTC day is wrong at one of them
    const [ahead, behind] = [dayAt('Pacific/Kiritimati'), dayAt('Pacific/Niue')]
    expect(ahead > behind).toBe(true)
    const { Site } = await import('../../server/models/sites/site.ts')
    await Equipment.update({ calibratedUntil: behind }, { where: { id: here.machine.id } })
    await Site.update({ timeZone: 'Pacific/Kiritimati' }, { where: { id: here.site.id } })
    expect((await start(here.agent, test!.id, here)).body.detail).toBe(`the calibration of ${here.machine.code} ended on ${behind}`)
    await Site.update({ timeZone: 'Pacific/Niue' }, { where: { id: here.site.id } })
    expect((await start(here.agent, test!.id, here)).status).toBe(200)
  })

  it('needs an authorisation for the method that has not ended', async () => {
    const here = await lab()
    const { tests: [test] } = await buildReady(here)
    const newcomer = await buildPerson({ role: 'technician', siteId: here.site.id })
    const agent = await app.agentFor(newcomer)
    const none = await start(agent, test!.id, here)
    expect([none.status, none.body.code]).toEqual([403, 'not-allowed'])
    expect(none.body.detail).toBe('You are not authorised to carry out Rockwell hardness, or the authorisation has ended.')
    await buildRight(newcomer, here.site.id, 'carry out', { until: '2020-01-31' })
    await buildRight(newcomer, here.site.id, 'carry out', { methodId: 'tensile' })
    await buildRight(newcomer, here.site.id, 'review')
    expect((await start(agent, test!.id, here)).status).toBe(403)
    await buildRight(newcomer, here.site.id, 'carry out')
    expect((await start(agent, test!.id, here)).status).toBe(200)
  })

  it('is for those at the bench: not the client, not the manager, and nothing of another site', async () => {
    const here = await lab()
    const { tests: [test] } = await buildReady(here)
    expect((await start(await app.agentFor(here.client), test!.id, here)).status).toBe(403)
    expect((await start(await app.agentFor(here.manager), test!.id, here)).status).toBe(403)
    expect((await start(await app.agentFor((await buildLab()).technician), test!.id, here)).status).toBe(404)
    await here.agent.post(`/api/tests/${randomUUID()}/runs`).send({ benchId: here.hardness.id }).expect(404)
  })

  it('does not begin a test anew that is recorded or accepted', async () => {
    const here = await lab()
    const { tests } = await buildReady(here, buildOrder({}, { count: 2 }))
    for (const [at, state] of (['recorded', 'accepted'] as const).entries()) {
      await Test.update({ state }, { where: { id: tests[at]!.id } })
      expect((await start(here.agent, tests[at]!.id, here)).body).toMatchObject({ code: 'not-now', detail: `this test is ${state}` })
    }
  })
})

describe('stopping a run', () => {
  it('needs a reason, leaves the run on record and the test ready, and the next run has the next number', async () => {
    const here = await lab()
    const { tests: [test], steps } = await buildReady(here)
    const { body: run } = await start(here.agent, test!.id, here)
    const { body: bad } = await here.agent.post(`/api/test-runs/${run.id}/stop`).send({ version: run.version, reason: '  ' }).expect(422)
    expect(bad.fields).toHaveProperty('reason')
    await (await app.agentFor(here.reviewer)).post(`/api/test-runs/${run.id}/stop`).send({ version: run.version, reason: 'not mine' }).expect(403)
    await here.agent.post(`/api/test-runs/${run.id}/stop`).send({ version: run.version + 1, reason: 'stale' }).expect(409)
    const { body: stopped } = await here.agent.post(`/api/test-runs/${run.id}/stop`).send({ version: run.version, reason: 'indenter chipped' }).expect(200)
    expect(stopped).toMatchObject({ state: 'stopped', remark: 'indenter chipped' })
    await here.agent.post(`/api/test-runs/${run.id}/stop`).send({ version: stopped.version, reason: 'again' }).expect(409)
    expect(await Test.findByPk(test!.id, { raw: true })).toMatchObject({ state: 'ready' })
    expect(await Step.findByPk(steps[1]!.id, { raw: true })).toMatchObject({ state: 'to come', benchId: null, startedAt: null })
    const { body: next } = await start(here.agent, test!.id, here)
    expect(next).toMatchObject({ number: 2, state: 'open' })
    expect((await eventsOf(run.id)).map(({ type }) => type)).toEqual(['test-run.started', 'test-run.stopped'])
    await here.agent.get(`/api/test-runs/${run.id}`).expect(200)
    await Authorisation.destroy({ where: { personId: here.technician.id, right: 'carry out' } })
    await here.agent.post(`/api/test-runs/${next.id}/stop`).send({ version: next.version, reason: 'authorisation gone' }).expect(200)
  })
})
