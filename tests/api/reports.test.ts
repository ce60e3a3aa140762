import { createHash } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { Hold } from '../../server/models/jobs/hold.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { Sample } from '../../server/models/jobs/sample.ts'
import { Test } from '../../server/models/jobs/test.ts'
import { Authorisation } from '../../server/models/people/authorisation.ts'
import { Customer } from '../../server/models/people/customer.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { Report } from '../../server/models/reports/report.ts'
import { newReportCode, readReportCode } from '../../server/services/reports/report-code.ts'
import { makeReport } from '../../worker/tasks/make-report.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { testPassword } from '../support/build/people.ts'
import { buildAcceptedJob, buildIssuedReport, buildOrderedReport, jobNow, reportNow } from '../support/build/reports.ts'
import { buildLab, buildReady } from '../support/build/runs.ts'
import { eventsOf } from '../support/events.ts'
import { runTask } from '../support/task.ts'

const app = await startTestApp()
const one = buildOrder({}, { count: 1 })
const bytes = (res: NodeJS.ReadableStream, done: (error: Error | null, body: Buffer) => void) => {
  const parts: Buffer[] = []
  res.on('data', (part: Buffer) => parts.push(part)).on('end', () => done(null, Buffer.concat(parts)))
}
let last = 0
/** Somebody with the paper in hand, at an address of their own. */
function holder() {
  last += 1
  return app.agent().set('X-Forwarded-For', `203.0.113.${last}`)
}

describe('issuing a report', () => {
  it('freezes what it says, ends the job\'s work and tells the worker', async () => {
    const lab = await buildLab()
    const { job } = await buildAcceptedJob(lab, one)
    const manager = await app.agentFor(lab.manager)
    const { body } = await manager.post(`/api/jobs/${job.id}/reports`).send({ version: job.version, password: testPassword }).expect(200)
    const report = await reportNow(job.id)
    expect(body).toMatchObject({ state: 'reported', version: job.version + 1, reports: [{ number: `${job.number.replace('J', 'R')}/1`, state: 'being made' }] })
    expect(report.code).toMatch(/^[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}-[0-9A-HJKMNP-TV-Z]{4}$/)
    expect(report.content).toMatchObject({ jobNumber: job.number, signatory: { name: lab.manager.name }, testers: [lab.technician.name], reviewers: [lab.reviewer.name], samples: [{ condition: 'clean, dry' }] })
    expect(report.content.rows[0]?.cells).toEqual({ 't0.mean': { reported: '31.4 HRC', number: '31.4', uncertainty: null, outcome: null } })
    expect(await Test.count({ where: { jobId: job.id, state: 'reported' } })).toBe(1)
    expect(await eventsOf(report.id)).toMatchObject([{ type: 'report.ordered', personId: lab.manager.id, data: { number: `${report.number}/1` } }])
    expect((await eventsOf(job.id)).map(({ type }) => type)).toContain('job.reported')
  })

  it('is refused without the password, and then nothing has happened', async () => {
    const lab = await buildLab()
    const { job } = await buildAcceptedJob(lab, one)
    const manager = await app.agentFor(lab.manager)
    const { body } = await manager.post(`/api/jobs/${job.id}/reports`).send({ version: job.version, password: 'not my password' }).expect(422)
    expect(body).toMatchObject({ code: 'not-acceptable', fields: { password: 'is not your password' } })
    expect(await Report.count({ where: { jobId: job.id } })).toBe(0)
    expect(await jobNow(job.id)).toMatchObject({ state: 'in review', version: job.version })
  })

  it('needs an authorisation to sign for every method, valid today', async () => {
    const lab = await buildLab()
    const { job } = await buildAcceptedJob(lab, one)
    await Authorisation.update({ until: '2020-01-31' }, { where: { personId: lab.manager.id, right: 'sign' } })
    const manager = await app.agentFor(lab.manager)
    const { body } = await manager.post(`/api/jobs/${job.id}/reports`).send({ version: job.version, password: testPassword }).expect(403)
    expect(body).toMatchObject({ code: 'not-allowed', detail: 'You are not authorised to sign reports of Rockwell hardness, or the authorisation has ended.' })
    expect(await Report.count({ where: { jobId: job.id } })).toBe(0)
  })

  it('waits for every test, and for holds', async () => {
    const lab = await buildLab()
    const { job } = await buildReady(lab, one)
    const manager = await app.agentFor(lab.manager)
    const ask = async (jobId: string) => manager.post(`/api/jobs/${jobId}/reports`).send({ version: (await jobNow(jobId)).version, password: testPassword }).expect(409)
    expect((await ask(job.id)).body.detail).toContain('1 of 1 test is not accepted yet')

    const { job: held, samples } = await buildAcceptedJob(lab, one)
    await Hold.create({ jobId: held.id, sampleId: samples[0]!.id, customerId: held.customerId, siteId: held.siteId, reason: 'The stamp cannot be read.', question: '', answers: [], placedById: lab.technician.id })
    await Job.increment({ holds: 1 }, { where: { id: held.id } })
    expect((await ask(held.id)).body).toMatchObject({ code: 'not-now', detail: expect.stringContaining('a hold is still open') })
  })

  it('leaves out tests that were called off, and says so', async () => {
    const lab = await buildLab()
    const { job, tests } = await buildAcceptedJob(lab, buildOrder({}, { count: 2 }))
    await Test.update({ state: 'void' }, { where: { id: tests[1]!.id } })
    const manager = await app.agentFor(lab.manager)
    await manager.post(`/api/jobs/${job.id}/reports`).send({ version: job.version, password: testPassword }).expect(200)
    const { content } = await reportNow(job.id)
    expect(content.rows.map(({ missing }) => missing)).toEqual([{}, { 't0.mean': 'not tested' }])
    expect(content.deviations).toEqual(['Sample 02, Rockwell HRC: ordered, but not tested.'])
  })

  it('makes one report of two clicks at once', async () => {
    const lab = await buildLab()
    const { job } = await buildAcceptedJob(lab, one)
    const manager = await app.agentFor(lab.manager)
    const answers = await Promise.all([1, 2].map(() => manager.post(`/api/jobs/${job.id}/reports`).send({ version: job.version, password: testPassword })))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(await Report.count({ where: { jobId: job.id } })).toBe(1)
  })

  it('is for managers of the site only', async () => {
    const lab = await buildLab()
    const { job } = await buildAcceptedJob(lab, one)
    const stranger = await buildHouse()
    const send = { version: job.version, password: testPassword }
    await (await app.agentFor(stranger.manager)).post(`/api/jobs/${job.id}/reports`).send(send).expect(404)
    await (await app.agentFor(lab.technician)).post(`/api/jobs/${job.id}/reports`).send(send).expect(403)
    await (await app.agentFor(lab.client)).post(`/api/jobs/${job.id}/reports`).send(send).expect(403)
  })
})

describe('a correction', () => {
  it('is a further revision that says what changed and supersedes the one before', async () => {
    const lab = await buildLab()
    const { job, report } = await buildIssuedReport(lab, one)
    const manager = await app.agentFor(lab.manager)
    const again = async () => manager.post(`/api/jobs/${job.id}/reports`).send({ version: (await jobNow(job.id)).version, password: testPassword })
    expect(await again()).toMatchObject({ status: 409, body: { detail: `nothing has changed since ${report.number}/1; there is nothing to correct` } })

    await Customer.update({ address: '5 Mill Lane, Brackwater' }, { where: { id: job.customerId } })
    await Sample.update({ heat: '7K4199' }, { where: { jobId: job.id } })
    expect((await again()).status).toBe(200)
    const second = await reportNow(job.id)
    expect(second).toMatchObject({ number: report.number, revision: 2, content: { supersedes: { number: `${report.number}/1`, changes: ['the customer\'s name or address', `heat of sample ${job.number}-01: 7K4199, was 7K4192`] } } })
    expect(second.code).not.toBe(report.code)
    const states = async () => Object.fromEntries((await ReportState.findAll({ where: { reportId: [report.id, second.id] }, raw: true })).map(({ reportId, state }) => [reportId, state]))
    expect(await states()).toEqual({ [report.id]: 'current', [second.id]: 'being made' })
    expect(await again()).toMatchObject({ status: 409, body: { detail: `report ${report.number}/2 is still being made` } })
    await runTask(makeReport, 'report.ordered')
    expect(await states()).toEqual({ [report.id]: 'superseded', [second.id]: 'current' })
    expect((await Report.findByPk(report.id, { raw: true }))?.content).toEqual(report.content)
    expect((await holder().get('/api/report-checks').query({ number: `${report.number}/1`, code: report.code }).expect(200)).body).toMatchObject({
      answer: 'superseded', revisions: [{ number: `${report.number}/1`, state: 'superseded' }, { number: `${report.number}/2`, state: 'current' }],
    })
  }, 90_000)
})

describe('reports', () => {
  it('are listed for their customer and their site\'s managers, found by number, order and customer', async () => {
    const lab = await buildLab()
    const { report, job } = await buildIssuedReport(lab, one)
    const { report: newer } = await buildIssuedReport(lab, one)
    const client = await app.agentFor(lab.client)
    const { body } = await client.get('/api/reports').expect(200)
    expect(body.items.map(({ id }: { id: string }) => id)).toEqual([newer.id, report.id])
    expect(body.items[1]).toMatchObject({ number: `${report.number}/1`, jobNumber: job.number, customerName: lab.customer.name, state: 'current', signedBy: lab.manager.name, samples: 1, code: report.code, mailedAt: null })
    const { body: first } = await client.get('/api/reports').query({ limit: 1 }).expect(200)
    const { body: next } = await client.get('/api/reports').query({ limit: 1, after: first.next }).expect(200)
    expect([first.items[0].id, next.items[0].id, next.next]).toEqual([newer.id, report.id, null])
    const manager = await app.agentFor(lab.manager)
    for (const search of [`${report.number}/1`, job.number.toLowerCase()]) expect((await manager.get('/api/reports').query({ search }).expect(200)).body.items).toMatchObject([{ id: report.id }])
    expect((await manager.get('/api/reports').query({ search: lab.customer.name }).expect(200)).body.items).toHaveLength(2)
    expect((await manager.get('/api/reports').query({ search: '100%' }).expect(200)).body.items).toEqual([])
  }, 90_000)

  it('of others are not there', async () => {
    const lab = await buildLab()
    const { report } = await buildIssuedReport(lab, one)
    const other = await buildHouse()
    for (const stranger of [other.client, other.manager]) {
      const agent = await app.agentFor(stranger)
      expect((await agent.get(`/api/reports/${report.id}`).expect(404)).body.code).toBe('not-found')
      expect((await agent.get(`/api/reports/${report.id}/pdf`).expect(404)).body.code).toBe('not-found')
      expect((await agent.get('/api/reports').expect(200)).body.items).toEqual([])
    }
    await (await app.agentFor(lab.technician)).get(`/api/reports/${report.id}/pdf`).expect(403)
  })

  it('are downloaded unchanged under their number, and who took them is noted', async () => {
    const lab = await buildLab()
    const { report } = await buildOrderedReport(lab, one)
    const client = await app.agentFor(lab.client)
    expect((await client.get(`/api/reports/${report.id}/pdf`).expect(409)).body.detail).toBe(`report ${report.number}/1 is still being made`)
    await runTask(makeReport, 'report.ordered')
    const { headers, body } = await client.get(`/api/reports/${report.id}/pdf`).buffer(true).parse(bytes as never).expect(200)
    expect(headers).toMatchObject({ 'content-type': 'application/pdf', 'content-disposition': expect.stringMatching(new RegExp(`^attachment; filename="?${report.number}-1\\.pdf"?$`)) })
    const state = await ReportState.findOne({ where: { reportId: report.id }, raw: true })
    expect(createHash('sha256').update(body).digest('hex')).toBe(state?.sha256)
    expect((await eventsOf(report.id)).at(-1)).toMatchObject({ type: 'report.downloaded', personId: lab.client.id })
  })
})

describe('checking a report', () => {
  it('says genuine and current to whoever holds number and code, however they type it, and nothing of the customer', async () => {
    const lab = await buildLab()
    const { report } = await buildIssuedReport(lab, one)
    for (const code of [report.code, report.code.toLowerCase().replaceAll('-', ' '), report.code.replaceAll('0', 'O').replaceAll('1', 'l')]) {
      const { body, text } = await holder().get('/api/report-checks').query({ number: `${report.number.toLowerCase()}/1`, code }).expect(200)
      expect(body).toMatchObject({ answer: 'genuine and current', number: `${report.number}/1`, company: 'Tarnwick Materials Testing', sha256: expect.stringMatching(/^[0-9a-f]{64}$/), revisions: [{ state: 'current' }] })
      expect(text).not.toContain(lab.customer.name)
    }
  })

  it('knows nothing of a wrong code, a wrong number, or a report that is still being made', async () => {
    const lab = await buildLab()
    const { report } = await buildIssuedReport(lab, one)
    const { report: unmade } = await buildOrderedReport(lab, one)
    const wrong = [
      { number: `${report.number}/1`, code: unmade.code }, { number: `${report.number}/2`, code: report.code }, { number: report.number, code: report.code }, { number: 'R-26-99999/1', code: report.code },
      { number: `${report.number}/1`, code: '' }, { number: '', code: '' }, { number: `${unmade.number}/1`, code: unmade.code }, { number: 'R-26-99999/1', code: '' },
    ]
    for (const query of wrong) {
      const { body } = await holder().get('/api/report-checks').query(query).expect(200)
      expect(body).toEqual({ answer: 'unknown', number: query.number, company: 'Tarnwick Materials Testing', issuedAt: null, sha256: null, revisions: [] })
    }
  })

  it('gets tired of guesses from one address', async () => {
    const guesser = holder()
    const statuses: number[] = []
    for (let n = 0; n < 40; n += 1) statuses.push((await guesser.get('/api/report-checks').query({ number: 'R-26-00001/1', code: `guess${n}` })).status)
    expect(statuses.filter((status) => status === 200)).toHaveLength(30)
    expect(statuses.at(-1)).toBe(429)
  })

  it('uses codes of 60 random bits', () => {
    const codes = Array.from({ length: 2000 }, newReportCode)
    expect(new Set(codes).size).toBe(2000)
    expect(new Set(codes.join('').replaceAll('-', '')).size).toBe(32)
    expect(readReportCode('k7q2 94md-xv3t')).toBe('K7Q294MDXV3T')
  })
})
