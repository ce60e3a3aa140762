import { randomUUID } from 'node:crypto'
import { QueryTypes } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { announceWith } from '../../../server/database/announce.ts'
import { database } from '../../../server/database/connection.ts'
import { linkHash, type LedgerRow } from '../../../server/database/ledger.ts'
import { inTransaction } from '../../../server/database/transaction.ts'
import { verifyLedger } from '../../../server/services/ledger/verify-ledger.ts'
import { asSuperuser } from '../../support/superuser.ts'

const nobody = { person: null, requestId: 'test' }
const customers = [randomUUID(), randomUUID(), randomUUID()]
const write = (text: string, customerId: string | null = customers[0]!) => inTransaction(nobody, (tx) => {
  tx.record({ type: 'message.written', id: randomUUID(), customerId, data: { text, nested: { b: [1, 2.5e-7, null], a: 'ü "quoted" \\ €' } }, touches: [{ subject: 'Job', id: randomUUID() }] })
  return Promise.resolve()
})
const ids = async () => (await database.query<{ id: number }>('select id from events order by id', { type: QueryTypes.SELECT })).map(({ id }) => id)

/** Alters the ledger past its triggers, looks, and puts everything back. */
async function tampered(sql: string, bind: unknown[] = []) {
  return asSuperuser(async (client) => {
    await client.query('create table kept_events as table events')
    await client.query('create table kept_heads as table chain_heads')
    await client.query('alter table events disable trigger user')
    await client.query(sql, bind)
    const verdict = await verifyLedger()
    await client.query('delete from events')
    await client.query('insert into events select * from kept_events')
    await client.query('delete from chain_heads')
    await client.query('insert into chain_heads select * from kept_heads')
    await client.query('alter table events enable trigger user')
    await client.query('drop table kept_events, kept_heads')
    return verdict
  })
}

describe('the ledger', () => {
  it('is whole when nothing happened and after anything was written', async () => {
    expect(await verifyLedger()).toEqual({ events: 0, broken: null })
    for (const [at, customerId] of [customers[0], customers[1], null, customers[0], customers[1]].entries()) await write(`event ${at}`, customerId)
    expect(await verifyLedger()).toEqual({ events: 5, broken: null })
  })

  it('numbers events without a gap when many write at once', async () => {
    const before = (await ids()).length
    await Promise.all(Array.from({ length: 20 }, (_, at) => write(`at once ${at}`, customers[at % 3])))
    const all = await ids()
    expect(all).toEqual(Array.from({ length: before + 20 }, (_, at) => at + 1))
    expect(await verifyLedger()).toEqual({ events: before + 20, broken: null })
  })

  it('keeps a customer\'s own chain, which the others\' events do not touch', async () => {
    const rows = await database.query<{ before: string; hash: string }>('select customer_previous_hash as before, customer_hash as hash from events where customer_id = $1 order by id', { bind: [customers[1]], type: QueryTypes.SELECT })
    expect(rows.length).toBeGreaterThan(3)
    expect(rows.map(({ before }) => before)).toEqual(['', ...rows.slice(0, -1).map(({ hash }) => hash)])
  })

  it('keeps nothing of a change that failed, not even a number', async () => {
    const before = await ids()
    await expect(inTransaction(nobody, (tx) => {
      tx.record({ type: 'message.written', id: randomUUID() })
      return Promise.reject(new Error('the change failed'))
    })).rejects.toThrow('the change failed')
    await write('after it')
    expect(await ids()).toEqual([...before, before.length + 1])
  })

  it('announces a change only once it can be read', async () => {
    const heard: number[] = []
    announceWith((id) => heard.push(id))
    await write('announced')
    await expect(inTransaction(nobody, (tx) => { tx.record({ type: 'message.written', id: randomUUID() }); return Promise.reject(new Error('no')) })).rejects.toThrow()
    await inTransaction(nobody, () => Promise.resolve())
    announceWith(() => {})
    expect(heard).toEqual([(await ids()).at(-1)])
  })

  it('tries a change again that met a deadlock, and writes its events once', async () => {
    await asSuperuser((client) => client.query(`insert into numbers values ('dead', 1, 0), ('lock', 1, 0)`))
    const before = (await ids()).length
    const cross = (first: string, second: string) => inTransaction(nobody, async (tx) => {
      const raise = (series: string) => database.query('update numbers set last = last + 1 where series = $1', { bind: [series], transaction: tx })
      await raise(first)
      await new Promise((resolve) => setTimeout(resolve, 100))
      await raise(second)
      tx.record({ type: 'message.written', id: randomUUID() })
    })
    await Promise.all([cross('dead', 'lock'), cross('lock', 'dead')])
    expect((await ids()).length).toBe(before + 2)
    const numbers = await database.query<{ last: number }>(`select last from numbers where series in ('dead', 'lock')`, { type: QueryTypes.SELECT })
    expect(numbers.map(({ last }) => last)).toEqual([2, 2])
  })

  it('is whole for who looks while others write', async () => {
    const writing = Promise.all(Array.from({ length: 15 }, (_, at) => write(`meanwhile ${at}`)))
    const verdicts = await Promise.all(Array.from({ length: 6 }, () => verifyLedger()))
    await writing
    expect(verdicts.map(({ broken }) => broken)).toEqual(Array(6).fill(null))
  })
})

describe('a ledger that someone altered', () => {
  it.each([
    ['what an event says', `update events set data = jsonb_set(data, '{text}', '"other"') where id = 3`],
    ['who did it', `update events set person_id = '00000000-0000-4000-8000-000000000001' where id = 3`],
    ['when it was', `update events set at = at - interval '1 day' where id = 3`],
    ['whose it is', `update events set customer_id = '00000000-0000-4000-8000-000000000001' where id = 3`],
    ['what it touched', `update events set touches = '[]' where id = 3`],
    ['its own link', `update events set hash = repeat('0', 64) where id = 3`],
  ])('names the event where %s was altered', async (_what, sql) => {
    expect((await tampered(sql)).broken?.id).toBe(3)
  })

  it('names the event that was deleted', async () => {
    const verdict = await tampered('delete from events where id = 3')
    expect(verdict).toMatchObject({ events: 2, broken: { why: 'event 3 is missing' } })
  })

  it('notices that the end was cut off, or everything, or the head', async () => {
    const last = (await ids()).at(-1)!
    expect((await tampered('delete from events where id > $1', [last - 2])).broken).toEqual({ id: last - 1, why: 'events are missing from the end' })
    expect((await tampered('delete from events')).broken).toEqual({ id: 1, why: 'events are missing from the end' })
    expect((await tampered('delete from chain_heads')).broken).not.toBeNull()
    expect((await tampered('delete from chain_heads where chain = $1', [customers[1]])).broken?.why).toContain(customers[1])
  })

  it('notices an event that was put in with a hash of its own', async () => {
    const last = (await ids()).at(-1)!
    const row: LedgerRow = { id: last + 1, type: 'message.written', subject: 'Message', subjectId: randomUUID(), jobId: null, customerId: null, siteId: null, personId: null, requestId: null, at: new Date().toISOString(), touches: [], data: {} }
    const insert = `insert into events (id, type, subject, subject_id, at, touches, data, previous_hash, hash) values ($1, $2, $3, $4, $5, '[]', '{}', '', $6)`
    expect((await tampered(insert, [row.id, row.type, row.subject, row.subjectId, row.at, linkHash('', row)])).broken).toEqual({ id: last + 1, why: 'it does not continue the event before it' })
  })

  it('notices an event moved to another customer\'s chain with the whole chain made anew', async () => {
    const verdict = await tampered(`update events set customer_previous_hash = 'x' where id = 4`)
    expect(verdict.broken).toEqual({ id: 4, why: "it does not continue its customer's chain" })
  })

  it('is whole again when it is put back', async () => {
    expect((await verifyLedger()).broken).toBeNull()
  })
})

it('the link depends on the order of nothing but the row: keys in any order, the same hash', () => {
  const row: LedgerRow = { id: 1, type: 't', subject: 'Job', subjectId: 's', jobId: null, customerId: null, siteId: null, personId: null, requestId: null, at: '2026-01-01T00:00:00.000Z', touches: [], data: { a: 1, b: { c: 2, d: 3 } } }
  expect(linkHash('', { ...row, data: { b: { d: 3, c: 2 }, a: 1 } })).toBe(linkHash('', row))
  expect(linkHash('', { ...row, data: { a: 1, b: { c: 2, d: 4 } } })).not.toBe(linkHash('', row))
  expect(linkHash('x', row)).not.toBe(linkHash('', row))
})
