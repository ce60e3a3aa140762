import { QueryTypes } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { database } from '../../server/database/connection.ts'
import { Person } from '../../server/models/people/person.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildPerson, testPassword } from '../support/build/people.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()

const cookieOf = (answer: { headers: Record<string, string> }): string => [answer.headers['set-cookie'] ?? ''].flat()[0] ?? ''
const valueOf = (cookie: string): string => /^crosshead=([^;]*)/.exec(cookie)?.[1] ?? ''
/** A signed-in browser and a copy of its cookie. */
async function signedIn(person: { email: string }) {
  const agent = app.agent()
  const answer = await agent.post('/api/session').send({ email: person.email, password: testPassword }).expect(200)
  return { agent, cookie: `crosshead=${valueOf(cookieOf(answer))}` }
}
const rowsOf = (personId: string) => database.query<{ sid: string; seconds: number }>(
  `select sid, extract(epoch from expire - now())::int as seconds from sessions where sess -> 'passport' ->> 'user' = $1`, { bind: [personId], type: QueryTypes.SELECT })

describe('signing in', () => {
  it('says who is there, and nobody before', async () => {
    const { technician, site } = await buildHouse()
    const before = await app.agent().get('/api/session').expect(200)
    expect(before.body).toEqual({ me: null, company: 'Tarnwick Materials Testing', demo: false, mailPage: null })
    expect(before.headers['set-cookie']).toBeUndefined()

    const agent = app.agent()
    const answer = await agent.post('/api/session').send({ email: technician.email.toUpperCase(), password: testPassword }).expect(200)
    expect(answer.body.me).toMatchObject({ id: technician.id, role: 'technician', siteIds: [site.id], place: site.name, customerId: null, timeZone: 'Europe/London' })
    expect((await agent.get('/api/session')).body.me.id).toBe(technician.id)
    expect((await eventsOf(technician.id)).map((event) => event.type)).toEqual(['person.signed-in'])
    expect((await Person.findByPk(technician.id))?.lastSignInAt).toBeInstanceOf(Date)
  })

  it('gives a client their organisation and a manager without a site all sites', async () => {
    const { client, customer, site } = await buildHouse()
    const everywhere = await buildPerson({ role: 'manager', name: 'Ada M. Brandt' })
    expect((await (await app.agentFor(client)).get('/api/session')).body.me).toMatchObject({ customerId: customer.id, customerName: customer.name, place: customer.name, siteIds: [] })
    const { me } = (await (await app.agentFor(everywhere)).get('/api/session')).body
    expect(me).toMatchObject({ place: 'All sites', initials: 'AB' })
    expect(me.siteIds).toContain(site.id)
  })

  it('sets a cookie that scripts cannot read and other sites cannot send', async () => {
    const { client } = await buildHouse()
    const cookie = cookieOf(await app.agent().post('/api/session').send({ email: client.email, password: testPassword }))
    expect(cookie).toMatch(/^crosshead=.+; Path=\/; HttpOnly; SameSite=Lax$/)
  })

  it('gives a new session id each time, so that one planted before is worth nothing', async () => {
    const { client } = await buildHouse()
    const agent = app.agent()
    const first = valueOf(cookieOf(await agent.post('/api/session').send({ email: client.email, password: testPassword })))
    const second = valueOf(cookieOf(await agent.post('/api/session').send({ email: client.email, password: testPassword })))
    expect(second).not.toBe(first)
    expect(await rowsOf(client.id)).toHaveLength(1)
    expect((await app.agent().get('/api/session').set('Cookie', `crosshead=${first}`)).body.me).toBeNull()
    expect((await app.agent().get('/api/session').set('Cookie', `crosshead=${second}`)).body.me.id).toBe(client.id)

    const planted = await app.agent().post('/api/session').set('Cookie', 'crosshead=s%3Aplanted.by-somebody').send({ email: client.email, password: testPassword })
    expect(valueOf(cookieOf(planted))).not.toContain('planted')
  })

  it('answers an unknown address, a wrong password, an invited and a disabled person alike', async () => {
    const { customer, client } = await buildHouse()
    const invited = await buildPerson({ role: 'client', customerId: customer.id, state: 'invited' })
    const disabled = await buildPerson({ role: 'client', customerId: customer.id, state: 'disabled' })
    const tries = [['nobody@nowhere.example', testPassword], [client.email, 'not the password'], [invited.email, testPassword], [disabled.email, testPassword]]
    for (const [email, password] of tries) {
      const { body, headers } = await app.agent().post('/api/session').send({ email, password }).expect(401)
      expect(body).toEqual({ code: 'wrong-sign-in', detail: 'the e-mail address or the password is not right', fields: {}, requestId: headers['x-request-id'] })
      expect(headers['content-type']).toContain('application/problem+json')
      expect(headers['set-cookie']).toBeUndefined()
    }
    const [refused] = await eventsOf(client.id)
    expect(refused).toMatchObject({ type: 'person.sign-in-refused', personId: null })
    expect(JSON.stringify(refused)).not.toContain('not the password')
  })

  it('refuses unknown keys and unreadable JSON', async () => {
    const { client } = await buildHouse()
    const odd = await app.agent().post('/api/session').send({ email: client.email, password: testPassword, role: 'manager' }).expect(422)
    expect(odd.body.code).toBe('not-acceptable')
    expect((await app.agent().post('/api/session').type('json').send('{"email":').expect(422)).body.detail).toBe('the request is not readable JSON')
    const { body } = await app.agent().post('/api/session').send({ email: 'not an address', password: '' }).expect(422)
    expect(Object.keys(body.fields)).toEqual(['email', 'password'])
  })
})

describe('a session', () => {
  it('lasts twelve hours without use, half an hour at a shared screen', async () => {
    const { client, technician } = await buildHouse()
    await app.agentFor(client)
    await app.agentFor(technician, { sharedScreen: true })
    const [long] = await rowsOf(client.id)
    const [short] = await rowsOf(technician.id)
    expect(long?.seconds).toBeGreaterThan(12 * 3600 - 60)
    expect(long?.seconds).toBeLessThanOrEqual(12 * 3600 + 1)
    expect(short?.seconds).toBeGreaterThan(29 * 60)
    expect(short?.seconds).toBeLessThanOrEqual(30 * 60 + 1)
  })

  it('is kept alive by use', async () => {
    const { client } = await buildHouse()
    const agent = await app.agentFor(client)
    const [{ sid } = { sid: '' }] = await rowsOf(client.id)
    await database.query(`update sessions set expire = now() + interval '5 minutes' where sid = $1`, { bind: [sid] })
    await agent.get('/api/session').expect(200)
    expect((await rowsOf(client.id))[0]?.seconds).toBeGreaterThan(11 * 3600)
  })

  it('ends when its time is over, and after seven days whatever happens', async () => {
    const { client, technician } = await buildHouse()
    const idle = await app.agentFor(client)
    await database.query(`update sessions set expire = now() - interval '1 second' where sess -> 'passport' ->> 'user' = $1`, { bind: [client.id] })
    await idle.get('/api/customers').expect(401)

    const old = await app.agentFor(technician)
    await database.query(`update sessions set sess = jsonb_set(sess, '{startedAt}', to_jsonb($2::bigint)) where sess -> 'passport' ->> 'user' = $1`, { bind: [technician.id, Date.now() - 7 * 24 * 3_600_000] })
    await old.get('/api/people').expect(401)
  })

  it('is ended by signing out, for every copy of the cookie', async () => {
    const { client } = await buildHouse()
    const { agent, cookie } = await signedIn(client)
    const answer = await agent.delete('/api/session').expect(200)
    expect(answer.body.me).toBeNull()
    expect(cookieOf(answer)).toMatch(/^crosshead=;.*Expires=Thu, 01 Jan 1970/)
    expect(await rowsOf(client.id)).toHaveLength(0)
    await app.agent().get('/api/customers').set('Cookie', cookie).expect(401)
    expect((await eventsOf(client.id)).at(-1)?.type).toBe('person.signed-out')
    await app.agent().delete('/api/session').expect(200)
  })

  it('is dead when its epoch is not the person\'s', async () => {
    const { client } = await buildHouse()
    const agent = await app.agentFor(client)
    await agent.get('/api/customers').expect(200)
    await Person.update({ sessionEpoch: 1 }, { where: { id: client.id } })
    await agent.get('/api/customers').expect(401)
  })

  it('of a disabled person is dead at once', async () => {
    const { technician, manager } = await buildHouse()
    const theirs = await app.agentFor(technician)
    await theirs.get('/api/people').expect(200)
    await (await app.agentFor(manager)).post(`/api/people/${technician.id}/disable`).send({ version: 0 }).expect(200)
    await theirs.get('/api/people').expect(401)
    expect(await rowsOf(technician.id)).toHaveLength(0)
  })
})

describe('changing the password', () => {
  const next = 'nine green hammers at dawn'

  it('ends all other sessions and keeps the one at hand, under a new id', async () => {
    const { client } = await buildHouse()
    const { agent: here, cookie: before } = await signedIn(client)
    const there = await app.agentFor(client)
    await here.put('/api/session/password').send({ current: testPassword, next }).expect(200)
    await here.get('/api/customers').expect(200)
    await there.get('/api/customers').expect(401)
    await app.agent().get('/api/customers').set('Cookie', before).expect(401)
    expect(await rowsOf(client.id)).toHaveLength(1)
    await app.agent().post('/api/session').send({ email: client.email, password: testPassword }).expect(401)
    await app.agent().post('/api/session').send({ email: client.email, password: next }).expect(200)
    expect((await eventsOf(client.id)).map((event) => event.type)).toContain('person.password-changed')
    expect(JSON.stringify(await eventsOf(client.id))).not.toContain(next)
  })

  it('needs the present password and a good new one', async () => {
    const { client } = await buildHouse()
    const agent = await app.agentFor(client)
    const change = async (current: string, wanted: string) => (await agent.put('/api/session/password').send({ current, next: wanted }).expect(422)).body.fields
    expect(await change('something else', next)).toHaveProperty('current')
    expect(await change(testPassword, testPassword)).toHaveProperty('next')
    expect(await change(testPassword, 'short')).toEqual({ next: 'at least 12 characters' })
    expect(await change(testPassword, 'x'.repeat(129))).toEqual({ next: 'at most 128 characters' })
    expect(await change(testPassword, 'Password1234')).toHaveProperty('next')
    expect(await change(testPassword, `${client.name}!1`)).toHaveProperty('next')
    await app.agent().put('/api/session/password').send({ current: testPassword, next }).expect(401)
  })

  it('happens once when two come at the same moment', async () => {
    const { client } = await buildHouse()
    const agent = await app.agentFor(client)
    const answers = await Promise.all([agent.put('/api/session/password').send({ current: testPassword, next }), agent.put('/api/session/password').send({ current: testPassword, next: `${next} again` })])
    expect(answers.filter((answer) => answer.status === 200)).toHaveLength(1)
    expect((await Person.findByPk(client.id))?.sessionEpoch).toBe(1)
  })
})
