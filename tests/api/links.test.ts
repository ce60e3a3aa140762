import { describe, expect, it } from 'vitest'
import { Link } from '../../server/models/people/link.ts'
import { Person } from '../../server/models/people/person.ts'
import { linkToken } from '../../server/services/people/link-token.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildPerson, testPassword } from '../support/build/people.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()
const password = 'nine green hammers at dawn'

/** A browser at an address of its own, so that the limits of one test are not those of another. */
let last = 0
function elsewhere() {
  last += 1
  return app.agent().set('X-Forwarded-For', `203.0.113.${last}`)
}

/** Asks for a reset and gives the token that the mail would hold. */
async function resetToken(person: Person): Promise<string> {
  await elsewhere().post('/api/password-resets').send({ email: person.email }).expect(200)
  const asked = (await eventsOf(person.id)).filter((event) => event.type === 'person.reset-asked').at(-1)
  return linkToken(String(asked?.data.linkId))
}

/** Invites a client of the house and gives them with the token that the mail would hold. */
async function invite() {
  const house = await buildHouse()
  const email = `new.${house.client.email}`
  const { body } = await (await app.agentFor(house.manager)).post('/api/people').send({ name: 'Ida Neumann', email, role: 'client', siteId: null, customerId: house.customer.id }).expect(200)
  const [invited] = await eventsOf(body.id)
  return { ...house, email, id: String(body.id), token: linkToken(String(invited?.data.linkId)) }
}

describe('asking for a new password', () => {
  it('answers the same for an address that nobody has', async () => {
    const { client } = await buildHouse()
    const known = await elsewhere().post('/api/password-resets').send({ email: client.email })
    const unknown = await elsewhere().post('/api/password-resets').send({ email: 'nobody@nowhere.example' })
    expect([known.status, known.body]).toEqual([200, { sent: true }])
    expect([unknown.status, unknown.body]).toEqual([known.status, known.body])
  })

  it('keeps the secret of the link out of the database and the ledger', async () => {
    const { client } = await buildHouse()
    const token = await resetToken(client)
    expect(token).toMatch(/^[A-Za-z0-9_-]{43}$/)
    const links = await Link.findAll({ where: { personId: client.id }, raw: true })
    expect(links).toHaveLength(1)
    expect(JSON.stringify([links, await eventsOf(client.id)])).not.toContain(token)
  })

  it('makes no link for a disabled person or one who has not come yet', async () => {
    const { customer } = await buildHouse()
    for (const state of ['disabled', 'invited'] as const) {
      const person = await buildPerson({ role: 'client', customerId: customer.id, state })
      await elsewhere().post('/api/password-resets').send({ email: person.email }).expect(200)
      expect(await Link.count({ where: { personId: person.id } })).toBe(0)
    }
  })

  it('is held back after three for one account, known or not', async () => {
    const { client } = await buildHouse()
    for (const email of [client.email, 'nobody-else@nowhere.example']) {
      for (const status of [200, 200, 200, 429]) await elsewhere().post('/api/password-resets').send({ email }).expect(status)
    }
  })
})

describe('a link', () => {
  it('says what it is for and sets the password once', async () => {
    const { client } = await buildHouse()
    const before = await app.agentFor(client)
    const token = await resetToken(client)
    const other = await resetToken(client)
    expect((await elsewhere().get(`/api/links/${token}`).expect(200)).body).toEqual({ purpose: 'password reset', email: client.email, name: client.name })

    const agent = elsewhere()
    expect((await agent.post(`/api/links/${token}`).send({ password }).expect(200)).body.me.id).toBe(client.id)
    await agent.get('/api/customers').expect(200)
    await before.get('/api/customers').expect(401)
    for (const spent of [token, other]) {
      await elsewhere().get(`/api/links/${spent}`).expect(404)
      await elsewhere().post(`/api/links/${spent}`).send({ password }).expect(404)
    }
    await app.agent().post('/api/session').send({ email: client.email, password: testPassword }).expect(401)
    await app.agent().post('/api/session').send({ email: client.email, password }).expect(200)
    expect((await eventsOf(client.id)).map((event) => event.type)).toContain('person.password-changed')
  })

  it('works for one of two who use it at once', async () => {
    const { client } = await buildHouse()
    const token = await resetToken(client)
    const answers = await Promise.all([1, 2, 3].map((n) => elsewhere().post(`/api/links/${token}`).send({ password: `${password} ${n}` })))
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 404, 404])
    expect((await Person.findByPk(client.id))?.sessionEpoch).toBe(1)
  })

  it('of a reset ends after an hour, of an invitation after three days', async () => {
    const { client } = await buildHouse()
    const reset = await resetToken(client)
    const { token, id } = await invite()
    const hoursLeft = async (personId: string) => (((await Link.findOne({ where: { personId }, raw: true }))?.expiresAt.getTime() ?? 0) - Date.now()) / 3_600_000
    expect(await hoursLeft(client.id)).toBeCloseTo(1, 1)
    expect(await hoursLeft(id)).toBeCloseTo(72, 1)
    await Link.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { personId: [client.id, id] } })
    await elsewhere().post(`/api/links/${reset}`).send({ password }).expect(404)
    await elsewhere().post(`/api/links/${token}`).send({ password }).expect(404)
  })

  it('of an invitation makes the account one\'s own', async () => {
    const { id, email, token } = await invite()
    expect((await elsewhere().get(`/api/links/${token}`).expect(200)).body).toEqual({ purpose: 'invitation', email, name: 'Ida Neumann' })
    expect((await elsewhere().post(`/api/links/${token}`).send({ password: 'neumann ida 1' }).expect(422)).body.fields).toHaveProperty('password')
    await elsewhere().post(`/api/links/${token}`).send({ password }).expect(200)
    expect(await Person.findByPk(id, { raw: true })).toMatchObject({ state: 'active', sessionEpoch: 1 })
    expect((await eventsOf(id)).map((event) => event.type)).toEqual(['person.invited', 'person.joined', 'person.signed-in'])
  })

  it('is worth nothing once its person is disabled', async () => {
    const { id, token, manager } = await invite()
    await (await app.agentFor(manager)).post(`/api/people/${id}/disable`).send({ version: 0 }).expect(200)
    await elsewhere().post(`/api/links/${token}`).send({ password }).expect(404)
  })

  it('cannot be guessed: thirty tries a minute from one address', async () => {
    const guesser = elsewhere()
    const statuses: number[] = []
    for (let n = 0; n < 31; n += 1) statuses.push((await guesser.get(`/api/links/${'x'.repeat(40)}${n}`)).status)
    expect(statuses.slice(0, 30).every((status) => status === 404)).toBe(true)
    expect(statuses[30]).toBe(429)
    await elsewhere().get(`/api/links/${'x'.repeat(43)}`).expect(404)
    await elsewhere().get('/api/links/short').expect(422)
  })
})
