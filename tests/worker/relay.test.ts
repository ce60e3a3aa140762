import { randomUUID } from 'node:crypto'
import { Queue } from 'bullmq'
import { Redis } from 'ioredis'
import { pino } from 'pino'
import { QueryTypes } from 'sequelize'
import { afterAll, afterEach, beforeEach, describe, expect, it } from 'vitest'
import { database } from '../../server/database/connection.ts'
import { inTransaction } from '../../server/database/transaction.ts'
import { carryOut, giveUp } from '../../worker/carry-out.ts'
import { handAgain, relayOnce, type Handed } from '../../worker/relay.ts'
import { startWorker, type Running } from '../../worker/start-worker.ts'
import { task, type Task } from '../../worker/task.ts'
import * as z from 'zod'
import { startTestApp } from '../support/app.ts'

await startTestApp()
const redisUrl = process.env.REDIS_URL ?? ''
const connection = new Redis(redisUrl, { maxRetriesPerRequest: null })
let prefix: string
let queue: Queue<Handed>
const running: Running[] = []

beforeEach(async () => {
  prefix = `test-${randomUUID().slice(0, 8)}`
  queue = new Queue<Handed>('tasks', { connection, prefix })
  // what earlier tests left is no work of this one
  await database.query(`update relay_cursors set event_id = (select event_id from chain_heads where chain = 'all')`)
  await database.query(`update task_deliveries set state = 'done'`)
})
afterEach(async () => {
  await Promise.all(running.splice(0).map((one) => one.stop()))
  await queue.obliterate({ force: true })
  await queue.close()
})
afterAll(() => connection.disconnect())

/** Something a task listens to, and something it does not. */
async function happen(count = 1): Promise<number[]> {
  await inTransaction({ person: null, requestId: 'test' }, (tx) => {
    for (let at = 0; at < count; at += 1) tx.record({ type: 'message.written', id: randomUUID(), data: { at } })
    return Promise.resolve()
  })
  return (await database.query<{ id: number }>('select id from events order by id desc limit $1', { bind: [count], type: QueryTypes.SELECT })).map(({ id }) => id).reverse()
}

function listening(run: (at: number, eventId: number) => Promise<void> | void, { name = 'note-message', attempts = 3 } = {}): Task {
  return task({ name, on: ['message.written'], payload: z.object({ at: z.int(), eventId: z.int() }), attempts, run: async ({ at, eventId }) => { await run(at, eventId) } })
}
const deliveries = () => database.query<{ eventId: number; state: string; error: string | null; done: boolean }>(
  `select event_id as "eventId", state, error, done_at is not null as done from task_deliveries where event_id > (select coalesce(max(event_id), 0) from task_deliveries where task = 'mark') order by event_id`, { type: QueryTypes.SELECT })
const stateOf = async (eventId: number, name = 'note-message') => (await database.query<{ state: string; error: string | null }>('select state, error from task_deliveries where event_id = $1 and task = $2', { bind: [eventId, name], type: QueryTypes.SELECT }))[0]
const cursor = async () => (await database.query<{ id: number }>(`select event_id as id from relay_cursors where name = 'tasks'`, { type: QueryTypes.SELECT }))[0]!.id

function start(tasks: readonly Task[], options: Partial<Parameters<typeof startWorker>[0]> = {}): Running {
  const one = startWorker({ redisUrl, prefix, tasks, sweeps: [], log: pino({ level: 'silent' }), pace: { relayMs: 30, againSeconds: 1 }, ...options })
  running.push(one)
  return one
}
async function until(holds: () => Promise<boolean> | boolean, ms = 15_000): Promise<void> {
  const end = Date.now() + ms
  while (!(await holds())) {
    if (Date.now() > end) throw new Error(`it did not come to pass; deliveries: ${JSON.stringify((await deliveries()).slice(-5))}`)
    await new Promise((resolve) => setTimeout(resolve, 30))
  }
}

describe('the relay', () => {
  it('hands each event once to each task that names it, and moves on', async () => {
    const first = listening(() => {})
    const second = listening(() => {}, { name: 'count-message' })
    const deaf = task({ name: 'deaf', on: ['job.placed'], payload: z.object({}), attempts: 1, run: () => Promise.resolve() })
    const [event] = await happen()
    expect(await relayOnce(queue, [first, second, deaf])).toBe(1)
    expect((await queue.getJobs()).map(({ data, opts }) => ({ ...data, attempts: opts.attempts })).sort((a, b) => a.task.localeCompare(b.task))).toEqual([
      { eventId: event, task: 'count-message', attempts: 3 }, { eventId: event, task: 'note-message', attempts: 3 },
    ])
    expect(await cursor()).toBe(event)
    expect(await relayOnce(queue, [first, second, deaf])).toBe(0)
    expect(await queue.count()).toBe(2)
  })

  it('by two at once hands nothing twice and leaves nothing out', async () => {
    const events = await happen(500)
    const one = listening(() => {})
    let passed = 0
    const relay = async () => { for (let idle = 0; idle < 5;) { const count = await relayOnce(queue, [one]); passed += count; idle = count === 0 ? idle + 1 : 0 } }
    await Promise.all([relay(), relay(), relay()])
    expect(passed).toBe(500)
    expect((await queue.getJobs(['waiting'], 0, 1000)).map(({ data }) => data.eventId).sort((a, b) => a - b)).toEqual(events)
    expect(await cursor()).toBe(events.at(-1))
  })

  it('stays where it is while the queue cannot be reached', async () => {
    const before = await cursor()
    const [event] = await happen()
    const away = { addBulk: () => Promise.reject(new Error('nobody there')) } as unknown as Queue<Handed>
    await expect(relayOnce(away, [listening(() => {})])).rejects.toThrow('nobody there')
    expect(await cursor()).toBe(before)
    expect(await stateOf(event!)).toBeUndefined()
    expect(await relayOnce(queue, [listening(() => {})])).toBe(1)
  })

  it('passes events that nobody waits for', async () => {
    const [event] = await happen()
    expect(await relayOnce(queue, [])).toBe(1)
    expect([await cursor(), await queue.count()]).toEqual([event, 0])
  })
})

describe('handed work', () => {
  it('is handed again after the queue was emptied, and finished', async () => {
    const done: number[] = []
    const one = listening((_at, eventId) => void done.push(eventId))
    const events = await happen(3)
    await relayOnce(queue, [one])
    await queue.obliterate({ force: true })
    expect(await handAgain(queue, [one], 60)).toBe(0)
    await database.query(`update task_deliveries set handed_at = now() - interval '2 minutes' where state = 'handed'`)
    expect(await handAgain(queue, [one], 60)).toBe(3)
    expect(await handAgain(queue, [one], 60)).toBe(0)
    start([one], { pace: { relayMs: 30, againSeconds: 600 } })
    await until(() => done.length >= 3)
    expect(done.sort((a, b) => a - b)).toEqual(events)
  })

  it('by two at once is handed again once', async () => {
    await happen(40)
    const one = listening(() => {})
    await relayOnce(queue, [one])
    await queue.obliterate({ force: true })
    await database.query(`update task_deliveries set handed_at = now() - interval '2 minutes' where state = 'handed'`)
    const counts = await Promise.all([handAgain(queue, [one], 60), handAgain(queue, [one], 60)])
    expect(counts[0] + counts[1]).toBe(40)
    expect(await queue.count()).toBe(40)
  })

  it('finds its way by itself when Redis lost everything', async () => {
    const done = new Set<number>()
    const one = listening((_at, eventId) => void done.add(eventId))
    const events = await happen(5)
    await relayOnce(queue, [one])
    await queue.obliterate({ force: true })
    start([one])
    await until(() => events.every((id) => done.has(id)))
    await until(async () => (await stateOf(events[4]!))?.state === 'done')
  })
})

describe('a task', () => {
  it('that fails twice is tried again and then done', async () => {
    let tries = 0
    const one = listening(() => { tries += 1; if (tries < 3) throw new Error(`not yet, ${tries}`) })
    const [event] = await happen()
    start([one], { pace: { relayMs: 30, againSeconds: 600 } })
    await until(async () => (await stateOf(event!))?.state === 'done')
    expect(tries).toBe(3)
    expect((await stateOf(event!))?.error).toBeNull()
  })

  it('that keeps failing is given up with its reason, and not handed again', async () => {
    let tries = 0
    const one = listening(() => { tries += 1; throw new Error('the machine is gone') }, { attempts: 2 })
    const [event] = await happen()
    start([one])
    await until(async () => (await stateOf(event!))?.state === 'given up')
    expect(await stateOf(event!)).toEqual({ state: 'given up', error: 'the machine is gone' })
    const tried = tries
    await new Promise((resolve) => setTimeout(resolve, 1500))
    expect(tries).toBe(tried)
    expect(tried).toBe(2)
  })

  it('does not hold up the others', async () => {
    const done: number[] = []
    const one = listening((at, eventId) => { if (at === 0) throw new Error('never'); done.push(eventId) }, { attempts: 2 })
    const events = await happen(4)
    start([one], { concurrency: 1 })
    await until(() => done.length === 3)
    expect(done.sort((a, b) => a - b)).toEqual(events.slice(1))
  })

  it('that is done is not done again, however often it is handed', async () => {
    let runs = 0
    const one = listening(() => { runs += 1 })
    const [event] = await happen()
    await relayOnce(queue, [one])
    for (let at = 0; at < 3; at += 1) await carryOut({ eventId: event!, task: one.name }, [one])
    expect(runs).toBe(1)
    await giveUp({ eventId: event!, task: one.name }, new Error('late news'))
    expect((await stateOf(event!))?.state).toBe('done')
  })

  it('is told the event as it stands in the ledger, and only what it asked for', async () => {
    const told: unknown[] = []
    const subjectId = randomUUID()
    const siteId = randomUUID()
    await inTransaction({ person: null, requestId: 'test' }, (tx) => { tx.record({ type: 'message.written', id: subjectId, siteId, data: { at: 7, more: 'x', siteId: 'not this' } }); return Promise.resolve() })
    const one = task({ name: 'hear', on: ['message.written'], payload: z.object({ subjectId: z.uuid(), siteId: z.uuid(), at: z.int() }), attempts: 1, run: (heard) => { told.push(heard); return Promise.resolve() } })
    const [event] = await database.query<{ id: number }>('select max(id) as id from events', { type: QueryTypes.SELECT })
    await carryOut({ eventId: event!.id, task: 'hear' }, [one])
    expect(told).toEqual([{ subjectId, siteId, at: 7 }])
  })

  it('that nobody knows, or of an event that is not there, fails and says so', async () => {
    const [event] = await happen()
    await expect(carryOut({ eventId: event!, task: 'unheard-of' }, [])).rejects.toThrow('no task is called unheard-of')
    await expect(carryOut({ eventId: 999_999_999, task: 'note-message' }, [listening(() => {})])).rejects.toThrow('there is no event 999999999')
  })

  it('carried out by two workers at once is done by both harmlessly or by one', async () => {
    const rows = new Set<number>()
    const one = listening((_at, eventId) => void rows.add(eventId))
    const events = await happen(30)
    start([one])
    start([one])
    await until(() => rows.size === 30)
    await until(async () => (await stateOf(events[29]!))?.state === 'done')
    expect([...rows].sort((a, b) => a - b)).toEqual(events)
  })
})

it('chores go on after one of them fails, and end with the worker', async () => {
  let turns = 0
  const one = start([], { sweeps: [() => { turns += 1; return turns === 1 ? Promise.reject(new Error('once')) : Promise.resolve() }], pace: { relayMs: 1000, sweepMs: 20 } })
  await until(() => turns >= 3)
  await one.stop()
  const ended = turns
  await new Promise((resolve) => setTimeout(resolve, 100))
  expect(turns).toBe(ended)
})
