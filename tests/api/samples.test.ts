import { describe, expect, it } from 'vitest'
import { Hold } from '../../server/models/jobs/hold.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { Message } from '../../server/models/jobs/message.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Test } from '../../server/models/jobs/test.ts'
import { Bench } from '../../server/models/sites/bench.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildBench } from '../support/build/benches.ts'
import { buildOrder, buildSampleOrder } from '../support/build/jobs.ts'
import { buildArrived, buildLab, buildWork } from '../support/build/runs.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

async function start() {
  const lab = await buildLab()
  return { ...lab, lab, agent: await app.agentFor(lab.technician) }
}
const receive = (agent: Agent, id: string, body: object = {}) => agent.post(`/api/samples/${id}/receive`).send({ version: 0, condition: 'clean, dry', mismatch: null, ...body })
const missing = (agent: Agent, id: string, body: object = {}) => agent.post(`/api/samples/${id}/missing`).send({ version: 0, remark: '', ...body })
const mismatch = { reason: 'It is stamped 7K4191.', question: 'Which heat is it?', answers: ['7K4191', '7K4192'] }

describe('taking a sample in', () => {
  it('keeps its condition, who and when, and puts the job in work', async () => {
    const { agent, lab } = await start()
    const { samples: [sample], job } = await buildWork(lab)
    const { body } = await receive(agent, sample!.id).expect(200)
    expect(body).toMatchObject({ state: 'received', condition: 'clean, dry', onHold: false, version: 1, holds: [], next: { label: 'section' } })
    expect(await Sample.findByPk(sample!.id, { raw: true })).toMatchObject({ receivedById: lab.technician.id, receivedAt: expect.any(Date) })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ state: 'in work', holds: 0 })
    expect(await eventsOf(sample!.id)).toMatchObject([{ type: 'sample.received', personId: lab.technician.id, data: { condition: 'clean, dry' } }])
  })

  it('needs a condition in words', async () => {
    const { agent, lab } = await start()
    const { samples: [sample] } = await buildWork(lab)
    expect((await receive(agent, sample!.id, { condition: ' ' }).expect(422)).body.fields).toHaveProperty('condition')
    expect((await receive(agent, sample!.id, { mismatch: { ...mismatch, question: '' } }).expect(422)).body.fields).toHaveProperty(['mismatch.question'])
  })

  it('that does not match the order puts it on hold and asks the customer', async () => {
    const { agent, lab } = await start()
    const { samples: [sample], job } = await buildWork(lab)
    const { body } = await receive(agent, sample!.id, { mismatch }).expect(200)
    expect(body).toMatchObject({ state: 'received', onHold: true, next: null, holds: [{ ...mismatch, answer: null, releasedAt: null, sampleNumber: sample!.number }] })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ holds: 1 })
    expect((await Message.findAll({ where: { jobId: job.id }, raw: true })).map(({ text }) => text)).toEqual([`Sample ${sample!.number} cannot go on: It is stamped 7K4191. Which heat is it?`])
    expect((await eventsOf(body.holds[0].id)).map(({ type }) => type)).toEqual(['hold.placed'])
    const client = await app.agentFor(lab.client)
    expect((await client.get(`/api/jobs/${job.id}`).expect(200)).body.holds).toMatchObject([{ question: 'Which heat is it?' }])
  })

  it('happens once: sent twice at once, again later, or on an old version', async () => {
    const { agent, lab } = await start()
    const { samples: [one, two], job } = await buildWork(lab, buildOrder({}, { count: 2 }))
    const answers = await Promise.all([receive(agent, one!.id, { mismatch }), receive(agent, one!.id, { mismatch })])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(await Hold.count({ where: { jobId: job.id } })).toBe(1)
    expect((await receive(agent, one!.id, { version: 1 }).expect(409)).body).toMatchObject({ code: 'not-now', detail: `sample ${one!.number} is received already` })
    expect((await receive(agent, two!.id, { version: 3 }).expect(409)).body.code).toBe('already-changed')
  })

  it('of two samples at once counts both holds', async () => {
    const { agent, lab } = await start()
    const { samples, job } = await buildWork(lab, buildOrder({}, { count: 4 }))
    const answers = await Promise.all(samples.map(({ id }) => receive(agent, id, { mismatch })))
    expect(answers.map(({ status }) => status)).toEqual([200, 200, 200, 200])
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ holds: 4, state: 'in work' })
  })

  it('is refused for a cancelled job, to the client, to the manager\'s own site only, and elsewhere', async () => {
    const { agent, lab } = await start()
    const { samples: [sample], job } = await buildWork(lab)
    await receive(await app.agentFor(lab.client), sample!.id).expect(403)
    await receive(await app.agentFor((await buildLab()).technician), sample!.id).expect(404)
    await receive(await app.agentFor((await buildLab()).manager), sample!.id).expect(404)
    await (await app.agentFor(lab.client)).post(`/api/jobs/${job.id}/cancel`).send({ version: job.version, reason: 'ordered twice' }).expect(200)
    expect((await receive(agent, sample!.id).expect(409)).body.code).toBe('not-now')
  })
})

describe('a sample that was not in the parcel', () => {
  it('is on hold with a question, and may still come', async () => {
    const { agent, lab } = await start()
    const { samples: [sample], job } = await buildWork(lab)
    const { body } = await missing(agent, sample!.id, { remark: 'The bag was torn.' }).expect(200)
    expect(body).toMatchObject({ state: 'missing', onHold: true, receivedAt: null, holds: [{ reason: 'it was not in the parcel. The bag was torn.', answers: ['It follows', 'Go on without it'] }] })
    expect((await missing(agent, sample!.id, { version: 1 }).expect(409)).body.code).toBe('not-now')
    const { body: came } = await receive(agent, sample!.id, { version: body.version }).expect(200)
    expect(came).toMatchObject({ state: 'received', onHold: true })
    const { body: free } = await agent.post(`/api/holds/${body.holds[0].id}/release`).send({ version: 0, remark: '' }).expect(200)
    expect(free).toMatchObject({ holds: [{ releasedAt: expect.any(String) }], samples: [{ onHold: false }] })
    expect(await Job.findByPk(job.id, { raw: true })).toMatchObject({ holds: 0 })
  })

  it('is missing or received, never both, when two people say so at once', async () => {
    const { agent, lab } = await start()
    const { samples: [sample] } = await buildWork(lab)
    const answers = await Promise.all([missing(agent, sample!.id), receive(await app.agentFor(lab.reviewer), sample!.id)])
    expect(answers.map(({ status }) => status).filter((status) => status === 200)).toHaveLength(1)
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })
})

describe('a step of preparation', () => {
  const begin = (agent: Agent, id: string, benchId: string) => agent.post(`/api/steps/${id}/start`).send({ benchId })
  const end = (agent: Agent, id: string, remark = '') => agent.post(`/api/steps/${id}/finish`).send({ remark })

  it('is started and finished once, whatever is clicked again', async () => {
    const { agent, lab } = await start()
    const { steps: [cut], tests: [test], samples: [sample] } = await buildArrived(lab)
    expect((await end(agent, cut!.id).expect(409)).body.detail).toBe('section has not begun')
    const answers = await Promise.all([begin(agent, cut!.id, lab.cutting.id), begin(agent, cut!.id, lab.cutting.id)])
    expect(answers.map(({ status }) => status)).toEqual([200, 200])
    expect(answers[0].body).toMatchObject({ state: 'in work', steps: [{ state: 'started', benchId: lab.cutting.id, personName: lab.technician.name }, {}] })
    const other = await app.agentFor(lab.reviewer)
    expect((await begin(other, cut!.id, lab.cutting.id).expect(409)).body.detail).toBe('section is started already')
    const ends = await Promise.all([end(agent, cut!.id, 'cut dry'), end(agent, cut!.id, 'cut dry')])
    expect(ends.map(({ status }) => status)).toEqual([200, 200])
    expect(ends[0].body.next).toMatchObject({ label: 'measure HRC', testId: test!.id })
    expect((await eventsOf(cut!.id)).map(({ type }) => type)).toEqual(['step.started', 'step.finished'])
    expect(await Step.findByPk(cut!.id, { raw: true })).toMatchObject({ state: 'done', remark: 'cut dry', endedAt: expect.any(Date) })
    expect(await Test.findByPk(test!.id, { raw: true })).toMatchObject({ state: 'ready' })
    expect((await begin(agent, cut!.id, lab.cutting.id).expect(409)).body.detail).toBe('section is done already')
    expect(await Sample.findByPk(sample!.id, { raw: true })).toMatchObject({ state: 'in work' })
  })

  it('follows the order of the traveller, for each test by itself', async () => {
    const { agent, lab } = await start()
    const does = await buildBench(lab.site.id, ['mount', 'grind and polish', 'etch'])
    const { steps } = await buildArrived(lab, buildOrder({}, { count: 1, methodIds: ['rockwell', 'grain-intercept'] }))
    const [cut, , mount, grind] = steps
    expect([cut!.capability, mount!.capability, grind!.capability]).toEqual(['section', 'mount', 'grind and polish'])
    expect((await begin(agent, mount!.id, does.id).expect(409)).body.detail).toBe('section has to be done first')
    await begin(agent, cut!.id, lab.cutting.id).expect(200)
    await end(agent, cut!.id).expect(200)
    expect((await begin(agent, grind!.id, does.id).expect(409)).body.detail).toMatch(/^mount/)
    // the hardness of the same sample may wait
    await begin(agent, mount!.id, does.id).expect(200)
  })

  it('is refused at the wrong bench, one out of use, on hold, before it came, and for a measurement', async () => {
    const { agent, lab } = await start()
    const { steps: [cut, measure], samples: [sample] } = await buildWork(lab)
    expect((await begin(agent, cut!.id, lab.cutting.id).expect(409)).body.detail).toBe(`sample ${sample!.number} is not received yet`)
    await receive(agent, sample!.id).expect(200)
    expect((await begin(agent, cut!.id, lab.hardness.id).expect(422)).body.fields).toEqual({ benchId: expect.stringMatching(/^does not do /) })
    await begin(agent, cut!.id, (await buildLab()).cutting.id).expect(404)
    expect((await begin(agent, measure!.id, lab.hardness.id).expect(409)).body.detail).toBe('a measurement begins on its sheet')
    expect((await end(agent, measure!.id).expect(409)).body.detail).toBe('a measurement ends by recording its run')
    await Sample.update({ onHold: true }, { where: { id: sample!.id } })
    expect((await begin(agent, cut!.id, lab.cutting.id).expect(409)).body.detail).toBe(`sample ${sample!.number} is on hold`)
    await Sample.update({ onHold: false }, { where: { id: sample!.id } })
    await Bench.update({ out: true }, { where: { id: lab.cutting.id } })
    expect((await begin(agent, cut!.id, lab.cutting.id).expect(409)).body.detail).toBe(`${lab.cutting.name} is out of use`)
    await begin(await app.agentFor(lab.manager), cut!.id, lab.cutting.id).expect(403)
    await begin(await app.agentFor((await buildLab()).technician), cut!.id, lab.cutting.id).expect(404)
  })
})

describe('finding', () => {
  it('a code or number by scan or by hand, in any case, among what one may see', async () => {
    const { agent, lab } = await start()
    const { samples: [sample], job } = await buildWork(lab)
    for (const typed of [sample!.code, sample!.code.toLowerCase(), sample!.number]) expect((await agent.get(`/api/codes/${typed}`).expect(200)).body).toEqual({ subject: 'Sample', id: sample!.id, number: sample!.number })
    expect((await agent.get(`/api/codes/${job.number}`).expect(200)).body).toEqual({ subject: 'Job', id: job.id, number: job.number })
    expect((await agent.get('/api/codes/S-NOTHING').expect(404)).body).toMatchObject({ code: 'not-found', detail: 'nothing here is called S-NOTHING' })
    await agent.get(`/api/codes/${encodeURIComponent("' or 1=1 --")}`).expect(404)
    await (await app.agentFor((await buildLab()).client)).get(`/api/codes/${sample!.code}`).expect(404)
  })

  it('samples by the start of heat, lot, number and code, in any case, and by state and job', async () => {
    const { agent, lab } = await start()
    const samples = [buildSampleOrder({ heat: 'Q77-50%', lot: 'L_9' }), buildSampleOrder({ heat: 'Q77-51', lot: 'LX9' })]
    const { samples: [first, second], job } = await buildWork(lab, { ...buildOrder(), samples })
    const numbers = async (query: object) => (await agent.get('/api/samples').query(query).expect(200)).body.items.map(({ number }: { number: string }) => number)
    expect(await numbers({ search: 'q77' })).toEqual([second!.number, first!.number])
    expect(await numbers({ search: 'Q77-50%' })).toEqual([first!.number])
    expect(await numbers({ search: 'L_9' })).toEqual([first!.number])
    expect(await numbers({ search: '77-50' })).toEqual([])
    expect(await numbers({ search: second!.code.toLowerCase() })).toEqual([second!.number])
    expect(await numbers({ search: first!.number.toLowerCase() })).toEqual([first!.number])
    expect(await numbers({ jobId: job.id, state: 'received' })).toEqual([])
    await receive(agent, first!.id).expect(200)
    expect(await numbers({ jobId: job.id, state: 'received' })).toEqual([first!.number])
  })

  it('samples in parts, none twice and none left out', async () => {
    const { agent, lab } = await start()
    const { samples } = await buildWork(lab, buildOrder({}, { count: 5 }))
    const found: string[] = []
    let after: string | null = null
    do {
      const { body } = await agent.get('/api/samples').query({ limit: 2, ...(after && { after }) }).expect(200) as { body: { items: { id: string }[]; next: string | null } }
      found.push(...body.items.map(({ id }) => id))
      after = body.next
    } while (after)
    expect(found).toEqual(samples.map(({ id }) => id).reverse())
  })
})

it('the client sees the sample without what is the lab\'s own: who, and why the plan is so', async () => {
  const { lab } = await start()
  const { samples: [sample] } = await buildArrived(lab)
  const { planSite } = await import('../../server/services/planning/plan-site.ts')
  await planSite(lab.site.id, {}, { person: null, requestId: 'test' })
  const path = `/api/samples/${sample!.id}`
  const { body: inside } = await (await app.agentFor(lab.technician)).get(path).expect(200)
  expect(inside.steps.map(({ why, personName }: { why: string; personName: string | null }) => [why !== '', personName !== null])).toEqual([[true, true], [true, true]])
  const { body: outside } = await (await app.agentFor(lab.client)).get(path).expect(200)
  expect(outside.steps.map(({ why, personName, rejected }: Record<string, unknown>) => ({ why, personName, rejected }))).toEqual([1, 2].map(() => ({ why: '', personName: null, rejected: [] })))
})
