import { randomUUID } from 'node:crypto'
import request from 'supertest'
import { DateTime } from 'luxon'
import type { FakeStripe } from '../../fakes/stripe/create-fake-stripe.ts'
import { Authorisation } from '../../server/models/people/authorisation.ts'
import type { Person } from '../../server/models/people/person.ts'
import { Bench } from '../../server/models/sites/bench.ts'
import type { Job } from '../../shared/api/jobs.ts'
import type { Sample } from '../../shared/api/samples.ts'
import type { TestRun } from '../../shared/api/test-runs.ts'
import { methods } from '../../shared/methods.ts'
import { usualHours } from '../../shared/planning/bench-hours.ts'
import { buildHouse, type House } from './build/house.ts'
import { buildOffers, buildOrder } from './build/jobs.ts'
import { testPassword } from './build/people.ts'
import { until } from './processes.ts'

export type Agent = ReturnType<typeof request.agent>

/** A house that can do every test of the story: benches, authorisations and offers. */
export async function buildWorkingHouse(): Promise<House> {
  const house = await buildHouse()
  const wide = { forceKn: [0, 600], forceKgf: [0, 3000], diameterMm: [1, 500] } satisfies Bench['does'][number]['limits']
  for (const kind of ['section', 'machine', 'mount', 'grind and polish', 'etch', ...methods.map(({ id }) => id)]) {
    await Bench.create({ siteId: house.site.id, name: `Bench for ${kind}`, code: `B-${randomUUID().slice(0, 8)}`, units: 2, does: [{ kind, limits: wide }], hours: usualHours })
  }
  const until = DateTime.utc().plus({ years: 1 }).toFormat('yyyy-MM-dd')
  const grant = async (person: Person, right: Authorisation['right']) => {
    for (const { id: methodId } of methods) await Authorisation.create({ personId: person.id, siteId: house.site.id, methodId, right, until, evidence: 'trial piece' })
  }
  await grant(house.technician, 'carry out')
  await grant(house.manager, 'review')
  await grant(house.manager, 'sign')
  await buildOffers(house.site.id)
  return house
}

export async function signIn(address: string, person: { email: string }): Promise<Agent> {
  const agent = request.agent(address).set('Sec-Fetch-Site', 'same-origin')
  await agent.post('/api/session').send({ email: person.email, password: testPassword }).expect(200)
  return agent
}

const good = async <T>(answer: request.Test, what: string): Promise<T> => {
  const { status, body } = await answer
  if (status !== 200) throw new Error(`${what}: ${status} ${JSON.stringify(body)}`)
  return body as T
}

/** A client orders one sample and pays; gives the job once it is placed. */
export async function orderAndPay(client: Agent, house: House, stripe: FakeStripe, { methodIds = ['rockwell'], count = 1 } = {}): Promise<Job> {
  const draft = await good<Job>(client.post('/api/jobs').send({}), 'draft')
  const order = buildOrder({ siteId: house.site.id }, { count, methodIds })
  const saved = await good<Job>(client.put(`/api/jobs/${draft.id}/order`).send({ version: draft.version, order }), 'save')
  const { url } = await good<{ url: string }>(client.post(`/api/jobs/${draft.id}/checkout`).send({ version: saved.version }), 'checkout')
  stripe.control.pay(/cs_[A-Za-z0-9_]+/.exec(url)![0])
  return until('the job is placed', async () => {
    const job = await good<Job>(client.get(`/api/jobs/${draft.id}`), 'job')
    return job.state === 'draft' ? null : job
  })
}

/** A technician receives every sample, does every step, and records a Rockwell set for each. */
export async function carryOut(technician: Agent, job: Job): Promise<TestRun[]> {
  const benches = await Bench.findAll({ where: { siteId: job.siteId }, raw: true })
  const benchFor = (capability: string) => benches.find(({ does }) => does.some(({ kind }) => kind === capability))!.id
  const runs: TestRun[] = []
  for (const { id } of job.samples) {
    const seen = await good<Sample>(technician.get(`/api/samples/${id}`), 'sample')
    await good(technician.post(`/api/samples/${id}/receive`).send({ version: seen.version, condition: 'undamaged', mismatch: null }), 'receive')
    for (const step of seen.steps) {
      if (!methods.some((method) => method.id === step.capability)) {
        await good(technician.post(`/api/steps/${step.id}/start`).send({ benchId: benchFor(step.capability) }), 'start')
        await good(technician.post(`/api/steps/${step.id}/finish`).send({ remark: '' }), 'finish')
        continue
      }
      const run = await good<TestRun>(technician.post(`/api/tests/${step.testId}/runs`).send({ benchId: benchFor(step.capability) }), 'run')
      const keep = [31.2, 31.6, 31.4].map((value, at) => ({ key: randomUUID(), path: `readings.${at}`, value: { value } }))
      const saved = await good<TestRun>(technician.put(`/api/test-runs/${run.id}/readings`).send({ version: run.version, keep, strike: [] }), 'readings')
      runs.push(await good<TestRun>(technician.post(`/api/test-runs/${run.id}/record`).send({ version: saved.version, remark: '' }), 'record'))
    }
  }
  return runs
}

/** A manager accepts every run and issues the report. */
export async function reviewAndIssue(manager: Agent, jobId: string, runs: readonly TestRun[]): Promise<Job> {
  for (const run of runs) await good(manager.post(`/api/test-runs/${run.id}/review`).send({ version: run.version, outcome: 'accepted', remark: '' }), 'review')
  const { version } = await good<Job>(manager.get(`/api/jobs/${jobId}`), 'job')
  return good<Job>(manager.post(`/api/jobs/${jobId}/reports`).send({ version, password: testPassword }), 'issue')
}
