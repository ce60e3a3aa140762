import { beforeAll, describe, expect, it } from 'vitest'
import { v7 } from 'uuid'
import { Hold } from '../../server/models/jobs/hold.ts'
import { Invoice } from '../../server/models/billing/invoice.ts'
import { planSite } from '../../server/services/planning/plan-site.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildOrder, buildSampleOrder } from '../support/build/jobs.ts'
import { buildOrderedReport } from '../support/build/reports.ts'
import { buildLab, buildRecordedRun, type Lab } from '../support/build/runs.ts'

const app = await startTestApp()
const heat = 'SECRET-7Q'
let own: Lab
let ids: { job: string; jobNumber: string; sample: string; sampleNumber: string; code: string; run: string; hold: string; invoice: string; file: string; report: string; reportNumber: string; test: string; step: string; reading: string }
const strangers: [string, () => Promise<Agent>][] = [
  ['a client of another customer', async () => app.agentFor((await buildLab()).client)],
  ['a technician of another site', async () => app.agentFor((await buildLab()).technician)],
  ['a manager of another site', async () => app.agentFor((await buildLab()).manager)],
]

beforeAll(async () => {
  own = await buildLab()
  const { job, samples: [sample], run, test, steps } = await buildRecordedRun(own, { ...buildOrder({ purchaseOrder: 'PO-SECRET-7Q' }), samples: [buildSampleOrder({ heat }), buildSampleOrder({ heat, lot: 'second' })] })
  const client = await app.agentFor(own.client)
  const { body: file } = await client.post(`/api/jobs/${job.id}/files`).attach('file', Buffer.from('a,b\n'), 'secret.csv').expect(200)
  const about = { jobId: job.id, customerId: job.customerId, siteId: job.siteId }
  const hold = await Hold.create({ ...about, sampleId: sample!.id, reason: 'bent', question: 'Go on?', answers: [], placedById: own.technician.id })
  const { report } = await buildOrderedReport(own)
  const invoice = (await Invoice.findOne({ where: { jobId: job.id }, raw: true }))!
  await planSite(own.site.id, {}, { person: null, requestId: 'test' })
  ids = {
    job: job.id, jobNumber: job.number, sample: sample!.id, sampleNumber: sample!.number, code: sample!.code, run: run.id, hold: hold.get('id'), invoice: invoice.id, file: file.id, report: report.id,
    reportNumber: report.number, test: test.id, step: steps[0]!.id, reading: run.readings[0]!.id,
  }
})

const reads: [string, () => string][] = [
  ['the job', () => `/jobs/${ids.job}`], ['its labels', () => `/jobs/${ids.job}/labels`], ['its events', () => `/jobs/${ids.job}/events`], ['a sample', () => `/samples/${ids.sample}`],
  ['a file', () => `/files/${ids.file}`], ['a picture of a file', () => `/files/${ids.file}?as=display`], ['a report', () => `/reports/${ids.report}`], ['a report\'s PDF', () => `/reports/${ids.report}/pdf`],
  ['an invoice', () => `/invoices/${ids.invoice}`], ['a run', () => `/test-runs/${ids.run}`], ['a queue', () => `/benches/${own.hardness.id}/queue`],
  ['a sample\'s code', () => `/codes/${ids.code}`], ['a sample\'s number', () => `/codes/${ids.sampleNumber}`], ['a job\'s number', () => `/codes/${ids.jobNumber}`], ['a report\'s number', () => `/codes/${ids.reportNumber}`],
]
const changes: [string, () => [string, object]][] = [
  ['cancel the job', () => [`/jobs/${ids.job}/cancel`, { version: 0, reason: 'x' }]], ['write about it', () => [`/jobs/${ids.job}/messages`, { text: 'x' }]], ['pay it', () => [`/jobs/${ids.job}/checkout`, { version: 0 }]],
  ['copy its order', () => ['/jobs', { from: ids.job }]], ['answer a hold', () => [`/holds/${ids.hold}/answer`, { version: 0, answer: 'x' }]], ['release a hold', () => [`/holds/${ids.hold}/release`, { version: 0, remark: '' }]],
  ['take a sample in', () => [`/samples/${ids.sample}/receive`, { version: 0, condition: 'x', mismatch: null }]], ['call it missing', () => [`/samples/${ids.sample}/missing`, { version: 0, remark: '' }]],
  ['start a step', () => [`/steps/${ids.step}/start`, { benchId: own.cutting.id }]], ['finish a step', () => [`/steps/${ids.step}/finish`, { remark: '' }]], ['start a run', () => [`/tests/${ids.test}/runs`, { benchId: own.hardness.id }]],
  ['record a run', () => [`/test-runs/${ids.run}/record`, { version: 0, remark: '' }]], ['stop a run', () => [`/test-runs/${ids.run}/stop`, { version: 0, reason: 'x' }]],
  ['review a run', () => [`/test-runs/${ids.run}/review`, { version: 0, outcome: 'accepted', remark: '', readings: [] }]], ['issue its report', () => [`/jobs/${ids.job}/reports`, { version: 0, password: 'seven blue anvils at noon' }]],
]
const secrets = () => [heat, ids.jobNumber, ids.sampleNumber, ids.code, ids.job, ids.sample, ids.run, ids.report, ids.invoice, own.customer.name]

describe.each(strangers)('%s', (_name, comeIn) => {
  let agent: Agent
  beforeAll(async () => { agent = await comeIn() })

  it.each(reads)('finds nothing at %s', async (_what, path) => {
    const { body, status, text } = await agent.get(`/api${path()}`)
    expect([403, 404]).toContain(status)
    expect(['not-found', 'not-allowed']).toContain(body.code)
    for (const secret of secrets().filter((one) => !path().includes(one))) expect(text).not.toContain(secret)
    // a role that may read such things elsewhere is told the same as of a thing that is not there
    const nowhere = await agent.get(`/api${path().replace(/[0-9a-f]{8}-[0-9a-f-]{27}/, v7())}`)
    if (!path().startsWith('/codes')) expect([nowhere.status, nowhere.body.code, nowhere.body.detail]).toEqual([status, body.code, body.detail])
  })

  it.each(changes)('cannot %s', async (_what, request) => {
    const [path, body] = request()
    const answer = await agent.post(`/api${path}`).send(body)
    expect([403, 404]).toContain(answer.status)
  })

  it('cannot remove a file, add one, or keep readings', async () => {
    expect([403, 404]).toContain((await agent.delete(`/api/files/${ids.file}`)).status)
    expect([403, 404]).toContain((await agent.delete(`/api/jobs/${ids.job}?version=0`)).status)
    expect([403, 404]).toContain((await agent.post(`/api/jobs/${ids.job}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv')).status)
    expect([403, 404]).toContain((await agent.put(`/api/test-runs/${ids.run}/readings`).send({ version: 0, keep: [], strike: [] })).status)
  })

  it('sees nothing of it in any list, search or count', async () => {
    const searches = [heat, ids.jobNumber, ids.sampleNumber, ids.code, 'PO-SECRET', own.customer.name, own.client.email].map(encodeURIComponent)
    const paths = ['/jobs', '/jobs?sort=due', '/job-counts', '/samples', `/samples?jobId=${ids.job}`, '/invoices', '/reports', '/reviews', '/benches', '/equipment', '/people?role=technician', `/floor?siteId=${own.site.id}`, '/floor',
      ...searches.flatMap((search) => [`/jobs?search=${search}`, `/samples?search=${search}`, `/reports?search=${search}`])]
    for (const path of paths) {
      const { text, status } = await agent.get(`/api${path}`)
      expect([200, 403], path).toContain(status)
      for (const secret of secrets().filter((one) => one !== own.customer.name || !path.startsWith('/people'))) expect(text, path).not.toContain(secret)
    }
  })
})

describe('those whose work it is', () => {
  it('find all of it', async () => {
    const manager = await app.agentFor(own.manager)
    for (const [, path] of reads.filter(([what]) => !/picture|PDF/.test(what))) expect((await manager.get(`/api${path()}`)).status, path()).toBe(200)
    const client = await app.agentFor(own.client)
    for (const what of ['the job', 'its labels', 'a sample', 'a file', 'a report', 'an invoice', 'a sample\'s code', 'a job\'s number']) {
      expect((await client.get(`/api${new Map(reads).get(what)!()}`)).status, what).toBe(200)
    }
    expect((await client.get(`/api/samples?search=${heat}`)).body.items).toHaveLength(2)
  })

  it('are not shown what is the lab\'s own: runs, queues, events', async () => {
    const client = await app.agentFor(own.client)
    for (const what of ['a run', 'a queue', 'its events']) expect((await client.get(`/api${new Map(reads).get(what)!()}`)).status, what).toBe(403)
    const { text } = await client.get(`/api/jobs/${ids.job}`).expect(200)
    // the run waits for review: no number of it is told yet
    expect(text).not.toContain('31.4 HRC')
  })
})
