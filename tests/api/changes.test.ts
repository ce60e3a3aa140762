import { randomUUID } from 'node:crypto'
import http from 'node:http'
import { afterEach, describe, expect, it } from 'vitest'
import { Redis } from 'ioredis'
import { announceWith } from '../../server/database/announce.ts'
import { inTransaction } from '../../server/database/transaction.ts'
import { changesChannel } from '../../server/integrations/changes-channel.ts'
import { writeMessage } from '../../server/services/jobs/talk/write-message.ts'
import { lastLedgerId } from '../../server/services/ledger/read-ledger.ts'
import { endpoints } from '../../shared/endpoints.ts'
import { startTestApp, type Agent } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildDraft, buildOffers, buildPlacedJob } from '../support/build/jobs.ts'
import { callerFor } from '../support/caller.ts'
import { cookieOf, openStream, type Stream } from '../support/stream.ts'

const app = await startTestApp()
const redis = new Redis(process.env.REDIS_URL ?? '')
announceWith((ledgerId) => void redis.publish(changesChannel(process.env.QUEUE_PREFIX ?? ''), String(ledgerId)))
const streams: Stream[] = []
afterEach(() => { for (const stream of streams.splice(0)) stream.close() })

async function open(person: { email: string }, headers: Record<string, string> = {}): Promise<Stream> {
  const stream = await openStream(app, await app.agentFor(person), headers)
  streams.push(stream)
  return stream
}

async function house() {
  const built = await buildHouse()
  await buildOffers(built.site.id)
  return built
}

describe('the stream of changes', () => {
  it('tells the customer and their lab of a job and nobody else', async () => {
    const [here, there] = [await house(), await house()]
    const [draft, other] = [await buildPlacedJob(here), await buildPlacedJob(there)]
    const own = await open(here.client)
    const lab = await open(here.manager)
    const strangers = [await open(there.client), await open(there.technician), await open(there.manager)]
    await writeMessage(draft.id, 'the second bar is bent', await callerFor(here.client))
    await own.until((text) => text.includes(draft.id))
    await lab.until((text) => text.includes(draft.id))
    await writeMessage(other.id, 'all is well', await callerFor(there.client))
    for (const stranger of strangers) await stranger.until((text) => text.includes(other.id))
    for (const stranger of strangers) expect(stranger.changes().map(({ id }) => id)).not.toContain(draft.id)
    for (const stream of [own, lab]) expect(stream.text()).not.toContain(other.id)
    for (const stream of [own, ...strangers]) expect(stream.text()).not.toContain('bent')
    expect(own.changes()).toContainEqual({ subject: 'Job', id: draft.id })
  })

  it('keeps a draft between the customer and their paper', async () => {
    const here = await house()
    const [client, manager] = [await open(here.client), await open(here.manager)]
    const draft = await buildDraft(here)
    const placed = await buildPlacedJob(here)
    for (const stream of [client, manager]) await stream.until((text) => text.includes(placed.id))
    expect(client.text()).toContain(draft.id)
    expect(manager.text()).not.toContain(draft.id)
  })

  it('says no more than what changed', async () => {
    const here = await house()
    const stream = await open(here.client)
    const draft = await buildDraft(here)
    await stream.until((text) => text.includes(draft.id))
    for (const change of stream.changes()) expect(Object.keys(change).sort()).toEqual(['id', 'subject'])
  })

  it('keeps the lab\'s own things from the customer', async () => {
    const here = await house()
    const [client, technician] = [await open(here.client), await open(here.technician)]
    const [step, run, seen] = [randomUUID(), randomUUID(), randomUUID()]
    const about = { customerId: here.customer.id, siteId: here.site.id }
    await inTransaction({ person: null, requestId: 'test' }, async (tx) => {
      tx.record({ type: 'step.started', id: step, ...about, touches: [{ subject: 'Bench', id: run }] })
      tx.record({ type: 'message.written', id: seen, ...about })
      return Promise.resolve()
    })
    await technician.until((text) => text.includes(seen))
    await client.until((text) => text.includes(seen))
    expect(technician.text()).toContain(step)
    expect(client.text()).not.toContain(step)
    expect(client.text()).not.toContain(run)
  })

  it('replays what was missed since the last number seen, once', async () => {
    const here = await house()
    const before = await lastLedgerId()
    const draft = await buildDraft(here)
    const other = await open(here.manager)
    const stream = await open(here.client, { 'Last-Event-ID': String(before) })
    await stream.until((text) => text.includes(draft.id))
    const second = await buildDraft(here)
    await stream.until((text) => text.includes(second.id))
    const numbers = stream.events().map(({ id }) => id)
    expect(numbers).toEqual([...new Set(numbers)].sort((a, b) => a - b))
    expect(numbers[0]).toBe(before)
    expect(other.text()).not.toContain(`"${draft.id}"`)
  })

  it('is not led astray by a number that was never given', async () => {
    const here = await house()
    const stream = await open(here.client, { 'Last-Event-ID': '999999999' })
    const later = await open(here.manager)
    const job = await buildPlacedJob(here)
    await stream.until((text) => text.includes(job.id))
    await later.until((text) => text.includes(job.id))
    for (const nonsense of ['-5', 'abc', '1e99']) await (await open(here.client, { 'Last-Event-ID': nonsense })).until((text) => text.includes('event: hello'))
  })

  it('tells who was away for long to fetch everything', async () => {
    const here = await house()
    const before = await lastLedgerId()
    await inTransaction({ person: null, requestId: 'test' }, async (tx) => {
      for (let at = 0; at < 1001; at += 1) tx.record({ type: 'message.written', id: randomUUID(), siteId: here.site.id })
      return Promise.resolve()
    })
    const stream = await open(here.technician, { 'Last-Event-ID': String(before) })
    await stream.until((text) => text.includes('event: everything'))
    expect(stream.changes()).toEqual([])
    expect(stream.events().at(-1)?.id).toBe(await lastLedgerId())
  })

  it('ends when the person signs out, and a second browser comes back past that', async () => {
    const { client } = await house()
    const [leaving, staying] = [await app.agentFor(client), await app.agentFor(client)]
    const [first, second] = [await openStream(app, leaving), await openStream(app, staying)]
    await leaving.delete('/api/session').expect(200)
    await Promise.all([first.ended, second.ended])
    await leaving.get('/api/changes').expect(401)
    const back = await openStream(app, staying, { 'Last-Event-ID': String(second.events().at(-1)?.id) })
    streams.push(back)
    await back.until((text) => text.includes('event: hello'))
    expect(await Promise.race([back.ended.then(() => 'ended'), new Promise((resolve) => setTimeout(resolve, 300, 'open'))])).toBe('open')
  })

  it('ends when the person is disabled', async () => {
    const here = await house()
    const stream = await open(here.technician)
    const manager = await app.agentFor(here.manager)
    await manager.post(`/api/people/${here.technician.id}/disable`).send({ version: 0 }).expect(200)
    await stream.ended
    expect(stream.text()).toContain('event: ended')
  })

  it('survives events that follow the end in the same breath', async () => {
    const here = await house()
    const stream = await open(here.technician)
    const caller = await callerFor(here.technician)
    const about = { siteId: here.site.id }
    await inTransaction(caller, async (tx) => {
      tx.record({ type: 'person.signed-out', id: here.technician.id, ...about })
      for (let at = 0; at < 5; at += 1) tx.record({ type: 'message.written', id: randomUUID(), ...about })
      return Promise.resolve()
    })
    await stream.ended
    // the whole process would be gone otherwise
    await app.agent().get('/api/session').expect(200)
    expect(stream.text()).not.toContain('Message')
  })

  it('needs a session', async () => {
    await app.agent().get('/api/changes').expect(401)
    expect(endpoints.find(({ path }) => path === '/changes')?.can).toBe('signed-in')
  })
})

describe('the events of a job', () => {
  it('are paged from the newest, and refuse a mark that is none', async () => {
    const here = await house()
    const job = await buildPlacedJob(here)
    const manager: Agent = await app.agentFor(here.manager)
    const read = async (after?: string) => (await manager.get(`/api/jobs/${job.id}/events`).query({ limit: 2, ...(after && { after }) }).expect(200)).body
    const first = await read()
    expect(first.items.map(({ type, by }: { type: string; by: string | null }) => [type, by])).toEqual([['payment.received', null], ['job.placed', null]])
    const rest = await read(first.next)
    expect(rest.items.map(({ type, by }: { type: string; by: string }) => [type, by])).toEqual([['job.order-changed', here.client.name], ['job.drafted', here.client.name]])
    expect(rest.next).toBeNull()
    for (const after of ['abc', '1.5', 'Infinity', '-1', '99999999999999999999']) {
      const { body } = await manager.get(`/api/jobs/${job.id}/events?after=${after}`).expect(422)
      expect(body.fields).toHaveProperty('after')
    }
    await (await app.agentFor((await house()).manager)).get(`/api/jobs/${job.id}/events`).expect(404)
  })
})

/** A browser that goes away while its stream is being opened leaves nothing behind. */
it('lets go of a stream whose browser has gone', async () => {
  const here = await house()
  const agent = await app.agentFor(here.client)
  const cookie = cookieOf(agent)
  await Promise.all(Array.from({ length: 20 }, () => new Promise<void>((resolve) => {
    const request = http.get(`${app.address}/api/changes`, { headers: { cookie, 'sec-fetch-site': 'same-origin' } })
    request.on('error', () => resolve())
    request.on('response', (response) => { response.on('error', () => resolve()); response.destroy(); resolve() })
    setTimeout(() => request.destroy(), 3)
  })))
  const stream = await open(here.client)
  const draft = await buildDraft(here)
  await stream.until((text) => text.includes(draft.id))
})
