import { describe, expect, it } from 'vitest'
import { File } from '../../server/models/jobs/file.ts'
import { Hold } from '../../server/models/jobs/hold.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Step } from '../../server/models/jobs/step.ts'
import { Authorisation } from '../../server/models/people/authorisation.ts'
import { Bench } from '../../server/models/sites/bench.ts'
import { Site } from '../../server/models/sites/site.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildDraft, buildOffers, buildOrder, buildPlacedJob, buildSampleOrder } from '../support/build/jobs.ts'
import { buildSite } from '../support/build/sites.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

async function start(methodIds?: readonly string[]) {
  const house = await buildHouse()
  await buildOffers(house.site.id, methodIds)
  return { ...house, client: house.client, agent: await app.agentFor(house.client) }
}

describe('a draft', () => {
  it('is numbered by year, empty, and the client\'s own', async () => {
    const { agent } = await start()
    const { body: first } = await agent.post('/api/jobs').send({}).expect(200)
    const { body: second } = await agent.post('/api/jobs').send({}).expect(200)
    expect(first).toMatchObject({ state: 'draft', money: 'unpaid', totalMinor: 0, samples: [], order: { samples: [], columns: [] }, notYetReportable: 'the job has not been placed' })
    expect(first.number).toMatch(/^J-\d\d-\d{5}$/)
    expect(Number(second.number.slice(5))).toBe(Number(first.number.slice(5)) + 1)
    expect((await eventsOf(first.id)).map(({ type }) => type)).toEqual(['job.drafted'])
  })

  it('gives each of many at once a number of its own', async () => {
    const { agent } = await start()
    const answers = await Promise.all(Array.from({ length: 6 }, () => agent.post('/api/jobs').send({})))
    expect(answers.map(({ status }) => status)).toEqual(Array(6).fill(200))
    expect(new Set(answers.map(({ body }) => body.number)).size).toBe(6)
  })

  it('keeps an order with its price and its words, faults and all', async () => {
    const { agent } = await start()
    const { body: draft } = await agent.post('/api/jobs').send({}).expect(200)
    const order = buildOrder({}, { count: 3, methodIds: ['rockwell', 'grain-intercept'] })
    order.samples.push(buildSampleOrder({ material: '', tests: [] }))
    const { body: saved } = await agent.put(`/api/jobs/${draft.id}/order`).send({ version: draft.version, order }).expect(200)
    // three samples of 18.00 and 62.00: 240.00, and 20 % of it
    expect(saved).toMatchObject({ version: draft.version + 1, netMinor: 24000, taxMinor: 4800, totalMinor: 28800, currency: 'GBP', order })
    const { body: list } = await agent.get('/api/jobs').expect(200)
    expect(list.items[0]).toMatchObject({ what: '4 samples, 42CrMo4 +QT, bar Ø 60', state: 'draft', traveller: [], purchaseOrder: 'BF-88213', totalMinor: 28800 })
    expect(list.items[0].tests).toMatch(/^Rockwell HRC, /)
  })

  it('saved from two tabs is kept once, and the other is told', async () => {
    const { agent } = await start()
    const { body: draft } = await agent.post('/api/jobs').send({}).expect(200)
    const save = (purchaseOrder: string) => agent.put(`/api/jobs/${draft.id}/order`).send({ version: draft.version, order: buildOrder({ purchaseOrder }) })
    const answers = await Promise.all([save('one'), save('two')])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(answers.find(({ status }) => status === 409)?.body.code).toBe('already-changed')
    const kept = answers.find(({ status }) => status === 200)?.body.order.purchaseOrder
    expect((await agent.get(`/api/jobs/${draft.id}`)).body.order.purchaseOrder).toBe(kept)
  })

  it('names a field that is not acceptable', async () => {
    const { agent } = await start()
    const { body: draft } = await agent.post('/api/jobs').send({}).expect(200)
    const order = { ...buildOrder(), samples: [{ ...buildSampleOrder(), piece: { form: 'bar', diameterMm: -3 } }] }
    const { body } = await agent.put(`/api/jobs/${draft.id}/order`).send({ version: 0, order }).expect(422)
    expect(Object.keys(body.fields)).toEqual(['order.samples.0.piece.diameterMm'])
    const foreign = await agent.put(`/api/jobs/${draft.id}/order`).send({ version: 0, order: buildOrder({ siteId: draft.id }) }).expect(422)
    expect(foreign.body.fields).toHaveProperty(['order.siteId'])
  })

  it('copies the samples and tests of an earlier job, without its purchase order', async () => {
    const house = await start()
    const job = await buildPlacedJob(house, buildOrder({ purchaseOrder: 'OLD-1' }))
    const { body } = await house.agent.post('/api/jobs').send({ from: job.id }).expect(200)
    expect(body).toMatchObject({ state: 'draft', totalMinor: job.totalMinor, order: { purchaseOrder: '', samples: job.order.samples } })
  })

  it('is gone when it is discarded, and cannot be discarded once placed', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    await house.agent.delete(`/api/jobs/${draft.id}?version=0`).expect(409)
    await house.agent.delete(`/api/jobs/${draft.id}?version=${draft.version}`).expect(200, { discarded: true })
    await house.agent.get(`/api/jobs/${draft.id}`).expect(404)
    const placed = await buildPlacedJob(house)
    const { body } = await house.agent.delete(`/api/jobs/${placed.id}?version=${placed.version}`).expect(409)
    expect(body.code).toBe('not-now')
  })

  it('takes its files along when another site is chosen', async () => {
    const house = await start()
    const other = await buildSite()
    await buildOffers(other.id)
    const draft = await buildDraft(house)
    await house.agent.post(`/api/jobs/${draft.id}/files`).attach('file', Buffer.from('a;b\n1;2\n'), 'values.csv').expect(200)
    await house.agent.put(`/api/jobs/${draft.id}/order`).send({ version: draft.version, order: buildOrder({ siteId: other.id }) }).expect(200)
    expect((await File.findAll({ where: { jobId: draft.id }, raw: true })).map(({ siteId }) => siteId)).toEqual([other.id])
  })
})

describe('a quote', () => {
  it('says price, each row\'s price, faults with ways out, and which site cannot', async () => {
    const { agent, site } = await start(['rockwell'])
    const bare = await buildSite()
    const order = buildOrder({}, { count: 2 })
    order.samples.push(buildSampleOrder({ piece: { form: 'sheet', thicknessMm: 0.3 } }))
    const { body } = await agent.post('/api/quotes').send({ order }).expect(200)
    expect(body).toMatchObject({ rowMinor: [1800, 1800, 1800], netMinor: 5400, taxMinor: 1080, totalMinor: 6480, promise: null })
    expect(body.lines).toEqual([{ name: 'Rockwell HRC', count: 3, unitMinor: 1800, totalMinor: 5400 }])
    expect(body.faults).toHaveLength(1)
    expect(body.faults[0]).toMatchObject({ row: 2, column: 'h' })
    expect(body.faults[0].cures.length).toBeGreaterThan(0)
    const because = (siteId: string) => body.sites.find((one: { siteId: string }) => one.siteId === siteId).because
    expect([because(site.id), because(bare.id)]).toEqual(['all tests are done here', 'does not offer Rockwell HRC'])
  })
})

describe('a promise', () => {
  const hours = [1, 2, 3, 4, 5].map((weekday) => ({ weekday, from: '08:00', to: '17:00' }))
  async function withBenches() {
    const house = await start(['rockwell'])
    await Site.update({ hours }, { where: { id: house.site.id } })
    const bench = (code: string, kind: string, limits: Record<string, [number, number]>) => Bench.create({ siteId: house.site.id, name: code, code: `${code} ${house.site.name}`, units: 1, hours, does: [{ kind, limits }] })
    await bench('Saw', 'section', {})
    await bench('Hardness', 'rockwell', { forceKgf: [15, 150] })
    return house
  }
  const quote = async (house: Awaited<ReturnType<typeof start>>, count: number) => (await house.agent.post('/api/quotes').send({ order: buildOrder({ siteId: house.site.id }, { count }) }).expect(200)).body

  it('is made from the benches and people of the site, later for more work, and kept when the job is placed', async () => {
    const house = await withBenches()
    const nobody = await quote(house, 1)
    expect(nobody.promise).toBeNull()
    expect(nobody.sites.find((one: { siteId: string }) => one.siteId === house.site.id)).toMatchObject({ finish: null, because: expect.stringMatching(/^measure HRC: /) })
    await Authorisation.create({ personId: house.technician.id, siteId: house.site.id, methodId: 'rockwell', right: 'carry out', until: '2099-12-31', evidence: 'witnessed' })
    const small = (await quote(house, 1)).promise
    const large = (await quote(house, 120)).promise
    expect(Date.parse(small.receiveBy)).toBeGreaterThan(Date.now())
    expect(Date.parse(small.finish)).toBeGreaterThan(Date.parse(small.receiveBy))
    expect(Date.parse(large.finish)).toBeGreaterThan(Date.parse(small.finish))
    const job = await buildPlacedJob(house, buildOrder({}, { count: 1 }))
    expect(job.promisedAt?.toISOString()).toBe(small.finish)
  })
})

describe('a placed job', () => {
  it('has samples, tests, steps and a traveller, and a line over all samples', async () => {
    const house = await start()
    const job = await buildPlacedJob(house, buildOrder({}, { count: 2, methodIds: ['rockwell', 'grain-intercept'] }))
    const { body } = await house.agent.get(`/api/jobs/${job.id}`).expect(200)
    expect(body.samples.map((sample: { number: string }) => sample.number)).toEqual([`${job.number}-01`, `${job.number}-02`])
    expect(body.samples[0]).toMatchObject({ state: 'expected', now: 'not here yet', lot: 'B-204' })
    expect(body.samples[0].tests).toHaveLength(2)
    const labels = body.samples[0].traveller.map((node: { label: string }) => node.label)
    expect(labels.slice(0, 3)).toEqual(['placed', 'receive', 'section'])
    expect(labels.filter((label: string) => label === 'section')).toHaveLength(1)
    expect(labels.slice(-2)).toEqual(['review', 'report'])
    const steps = await Step.findAll({ where: { jobId: job.id }, order: [['sampleId', 'ASC'], ['position', 'ASC']], raw: true })
    expect(steps.filter(({ type, testId }) => type === 'section' && testId === null)).toHaveLength(2)
    expect(steps.every(({ state }) => state === 'to come')).toBe(true)
    const { body: list } = await house.agent.get('/api/jobs?state=placed').expect(200)
    expect(list.items[0].traveller[0]).toMatchObject({ label: 'placed', state: 'done' })
    expect(list.items[0].traveller.find((node: { label: string }) => node.label === 'receive')).toMatchObject({ state: 'todo', part: 0 })
    await Sample.update({ receivedAt: new Date(), state: 'received' }, { where: { number: `${job.number}-01` } })
    const { body: after } = await house.agent.get('/api/jobs?state=placed').expect(200)
    expect(after.items[0].traveller.find((node: { label: string }) => node.label === 'receive')).toMatchObject({ state: 'part', part: 0.5 })
  })

  it('gives every sample a scan code of its own that cannot be guessed', async () => {
    const house = await start()
    const job = await buildPlacedJob(house, buildOrder({}, { count: 40 }))
    const codes = (await Sample.findAll({ where: { jobId: job.id }, raw: true })).map(({ code }) => code)
    expect(new Set(codes).size).toBe(40)
    for (const code of codes) expect(code).toMatch(/^S-[0-9A-HJKMNP-TV-Z]{10}$/)
  })

  it('prints labels with codes once it is placed', async () => {
    const house = await start()
    const draft = await buildDraft(house)
    await house.agent.get(`/api/jobs/${draft.id}/labels`).expect(409)
    const job = await buildPlacedJob(house)
    const { body } = await house.agent.get(`/api/jobs/${job.id}/labels`).expect(200)
    expect(body).toMatchObject({ jobNumber: job.number, siteName: house.site.name, purchaseOrder: 'BF-88213' })
    expect(body.labels).toHaveLength(2)
    expect(body.labels[0]).toMatchObject({ number: `${job.number}-01`, size: 'bar Ø 60', tests: ['Rockwell HRC'] })
    expect(body.labels[0].code).toMatch(/^<svg /)
    expect(body.labels[0].code).not.toBe(body.labels[1].code)
  })

  it('is cancelled before work, with everything it stood for, and not twice', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    const { body } = await house.agent.post(`/api/jobs/${job.id}/cancel`).send({ version: job.version, reason: 'ordered twice' }).expect(200)
    expect(body).toMatchObject({ state: 'cancelled', money: 'paid' })
    expect(body.samples.every((sample: { state: string }) => sample.state === 'void')).toBe(true)
    expect((await eventsOf(job.id)).map(({ type }) => type).slice(-2)).toEqual(['job.cancelled', 'payment.refund-owed'])
    await house.agent.post(`/api/jobs/${job.id}/cancel`).send({ version: body.version, reason: 'again' }).expect(409)
  })

  it('cannot be cancelled once work on it has begun', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    await Step.update({ state: 'started', startedAt: new Date() }, { where: { jobId: job.id, position: 1 } })
    const { body } = await house.agent.post(`/api/jobs/${job.id}/cancel`).send({ version: job.version, reason: 'too late' }).expect(409)
    expect(body.code).toBe('not-now')
    expect((await Job.findByPk(job.id, { raw: true }))?.state).toBe('placed')
  })

  it('is asked about by hold, answered by the customer and released by the lab', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    const sample = await Sample.findOne({ where: { jobId: job.id, position: 1 }, raw: true })
    const hold = await Hold.create({ jobId: job.id, sampleId: sample?.id ?? null, customerId: job.customerId, siteId: job.siteId, reason: 'stamp differs', question: 'Which heat?', answers: ['7K4192', '7K4193'], placedById: house.technician.id })
    await Sample.update({ onHold: true }, { where: { id: sample?.id ?? '' } })
    await Job.update({ holds: 1 }, { where: { id: job.id } })
    const bench = await app.agentFor(house.technician)
    await bench.post(`/api/holds/${hold.id}/answer`).send({ version: 0, answer: 'guessed' }).expect(403)
    const { body: answered } = await house.agent.post(`/api/holds/${hold.id}/answer`).send({ version: 0, answer: '7K4193' }).expect(200)
    expect(answered.holds[0]).toMatchObject({ answer: '7K4193', releasedAt: null, sampleNumber: `${job.number}-01` })
    expect(answered.notYetReportable).toBe('a hold is still open')
    await house.agent.post(`/api/holds/${hold.id}/answer`).send({ version: 1, answer: 'no, 7K4192' }).expect(409)
    await house.agent.post(`/api/holds/${hold.id}/release`).send({ version: 1, remark: '' }).expect(403)
    const { body: released } = await bench.post(`/api/holds/${hold.id}/release`).send({ version: 1, remark: 'Corrected to 7K4193.' }).expect(200)
    expect(released.holds[0].releasedAt).not.toBeNull()
    expect(released.samples[0].onHold).toBe(false)
    expect(released.messages.map((message: { text: string }) => message.text)).toEqual(['Corrected to 7K4193.'])
    await bench.post(`/api/holds/${hold.id}/release`).send({ version: 2, remark: '' }).expect(409)
  })

  it('carries messages of both sides', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    await house.agent.post(`/api/jobs/${job.id}/messages`).send({ text: 'Please hurry' }).expect(200)
    const { body } = await (await app.agentFor(house.manager)).post(`/api/jobs/${job.id}/messages`).send({ text: 'We do' }).expect(200)
    expect(body.messages.map(({ text, mine }: { text: string; mine: boolean }) => [text, mine])).toEqual([['Please hurry', false], ['We do', true]])
  })
})

describe('lists of jobs', () => {
  it('come in parts, newest first or the most urgent first, without gap or double', async () => {
    const house = await start()
    for (const neededBy of ['2027-03-05', null, '2027-03-01', '2027-03-05', null]) await buildDraft(house, buildOrder({ neededBy }))
    for (const sort of ['newest', 'due']) {
      const seen: { id: string; neededBy: string | null }[] = []
      let after = ''
      do {
        const { body } = await house.agent.get(`/api/jobs?limit=2&sort=${sort}${after ? `&after=${encodeURIComponent(after)}` : ''}`).expect(200)
        seen.push(...body.items)
        after = body.next ?? ''
      } while (after)
      expect(new Set(seen.map(({ id }) => id)).size).toBe(5)
      if (sort === 'due') expect(seen.map(({ neededBy }) => neededBy)).toEqual(['2027-03-01', '2027-03-05', '2027-03-05', null, null])
    }
    await house.agent.get('/api/jobs?sort=due&after=nonsense').expect(422)
    await house.agent.get('/api/jobs?sort=newest&after=nonsense').expect(422)
  })

  it('find by number, purchase order and heat, and take no character for a pattern', async () => {
    const house = await start()
    const job = await buildPlacedJob(house, buildOrder({ purchaseOrder: 'PO_100%' }))
    await buildDraft(house, buildOrder({ purchaseOrder: 'POX1000', samples: [] }))
    for (const search of [job.number, 'PO_100%', '7K41', 'b-205']) {
      const { body } = await house.agent.get(`/api/jobs?search=${encodeURIComponent(search)}`).expect(200)
      expect(body.items.map(({ id }: { id: string }) => id)).toEqual([job.id])
    }
    await house.agent.get(`/api/jobs?search=${encodeURIComponent("'; drop table jobs; --")}`).expect(200, { items: [], next: null })
  })

  it('are counted by state', async () => {
    const house = await start()
    await buildDraft(house)
    await buildDraft(house)
    await buildPlacedJob(house)
    const { body } = await house.agent.get('/api/job-counts').expect(200)
    expect(body.counts).toEqual({ draft: 2, placed: 1, 'awaiting samples': 0, 'in work': 0, 'in review': 0, reported: 0, closed: 0, cancelled: 0 })
  })
})

describe('another customer', () => {
  it('finds none of it, whatever is asked', async () => {
    const house = await start()
    const job = await buildPlacedJob(house)
    const draft = await buildDraft(house)
    const stranger = await app.agentFor((await buildHouse()).client)
    const tries = [
      stranger.get(`/api/jobs/${job.id}`), stranger.get(`/api/jobs/${job.id}/labels`), stranger.put(`/api/jobs/${draft.id}/order`).send({ version: draft.version, order: buildOrder() }),
      stranger.delete(`/api/jobs/${draft.id}?version=${draft.version}`), stranger.post('/api/jobs').send({ from: job.id }), stranger.post(`/api/jobs/${draft.id}/checkout`).send({ version: draft.version }),
      stranger.post(`/api/jobs/${draft.id}/payment-check`).send({}), stranger.post(`/api/jobs/${draft.id}/reopen`).send({ version: draft.version }),
      stranger.post(`/api/jobs/${job.id}/cancel`).send({ version: job.version, reason: 'mine now' }), stranger.post(`/api/jobs/${job.id}/messages`).send({ text: 'hello' }),
      stranger.post(`/api/jobs/${job.id}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv'),
    ]
    for (const answer of await Promise.all(tries)) expect([answer.status, answer.body.code]).toEqual([404, 'not-found'])
    expect((await stranger.get('/api/jobs')).body.items).toEqual([])
    expect((await stranger.get('/api/job-counts')).body.counts.placed).toBe(0)
  })
})
