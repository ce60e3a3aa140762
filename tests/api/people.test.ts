import { describe, expect, it } from 'vitest'
import { Person } from '../../server/models/people/person.ts'
import { methods } from '../../shared/methods.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildPerson } from '../support/build/people.ts'
import { eventsOf } from '../support/events.ts'

const app = await startTestApp()
const inDays = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10)

describe('listing people', () => {
  it('shows a manager their site and all clients, and nobody of another site', async () => {
    const house = await buildHouse()
    const other = await buildHouse()
    const agent = await app.agentFor(house.manager)
    const ids = (await agent.get('/api/people?limit=200').expect(200)).body.items.map((person: { id: string }) => person.id)
    for (const seen of [house.technician, house.manager, house.client, other.client]) expect(ids).toContain(seen.id)
    for (const hidden of [other.technician, other.manager]) expect(ids).not.toContain(hidden.id)
  })

  it('shows others themselves only', async () => {
    const { client, technician, site, customer } = await buildHouse()
    expect((await (await app.agentFor(client)).get('/api/people').expect(200)).body.items).toMatchObject([{ id: client.id, customerName: customer.name, siteName: null, authorisations: [] }])
    expect((await (await app.agentFor(technician)).get('/api/people').expect(200)).body.items).toMatchObject([{ id: technician.id, siteName: site.name, state: 'active' }])
  })

  it('never shows a hash', async () => {
    const { manager } = await buildHouse()
    expect(JSON.stringify((await (await app.agentFor(manager)).get('/api/people')).body)).not.toMatch(/argon2|epoch/i)
  })

  it('finds by part of a name, takes signs literally, narrows to a role, and comes in pages', async () => {
    const { site, manager } = await buildHouse()
    const mark = site.id.slice(-8)
    for (const name of [`Ann ${mark}`, `Ben_${mark}`, `Cem ${mark}`]) await buildPerson({ role: 'technician', siteId: site.id, name })
    const agent = await app.agentFor(manager)
    const names = async (query: string) => (await agent.get(`/api/people?${query}`).expect(200)).body.items.map((person: { name: string }) => person.name)
    expect(await names(`search=${mark.toUpperCase()}`)).toHaveLength(3)
    expect(await names('search=n_')).toEqual([`Ben_${mark}`])
    expect(await names(`search=${mark}&role=manager`)).toEqual([])

    const first = (await agent.get(`/api/people?search=${mark}&limit=2`)).body
    expect(first.items).toHaveLength(2)
    const second = (await agent.get(`/api/people?search=${mark}&limit=2&after=${first.next}`)).body
    expect(second.items.map((person: { name: string }) => person.name)).toEqual([`Cem ${mark}`])
    expect(second.next).toBeNull()
    await agent.get('/api/people?after=nonsense').expect(422)
  })
})

describe('inviting', () => {
  it('adds a colleague of one\'s site and records it', async () => {
    const { manager, site } = await buildHouse()
    const email = `New.${manager.email}`
    const { body } = await (await app.agentFor(manager)).post('/api/people').send({ name: ' Lea Roth ', email, role: 'technician', siteId: site.id, customerId: null }).expect(200)
    expect(body).toMatchObject({ name: 'Lea Roth', email: email.toLowerCase(), state: 'invited', siteId: site.id, version: 0, lastSignInAt: null })
    const [invited] = await eventsOf(body.id)
    expect(invited).toMatchObject({ type: 'person.invited', personId: manager.id })
  })

  it('is for managers, at their own site', async () => {
    const { manager, technician, client } = await buildHouse()
    const other = await buildHouse()
    const wanted = { name: 'Lea Roth', email: `lea.${manager.email}`, role: 'technician', siteId: other.site.id, customerId: null }
    await (await app.agentFor(manager)).post('/api/people').send(wanted).expect(403)
    for (const person of [technician, client]) await (await app.agentFor(person)).post('/api/people').send(wanted).expect(403)
    await app.agent().post('/api/people').send(wanted).expect(401)
    expect(await Person.count({ where: { email: wanted.email } })).toBe(0)
  })

  it('refuses a role without its place, an unknown place and an address that is taken, naming the field', async () => {
    const { manager, site, customer, client } = await buildHouse()
    const agent = await app.agentFor(manager)
    const fields = async (change: object) => {
      const { body } = await agent.post('/api/people').send({ name: 'Lea Roth', email: `lea.${manager.email}`, role: 'client', siteId: null, customerId: customer.id, ...change }).expect(422)
      return Object.keys(body.fields)
    }
    expect(await fields({ customerId: null })).toEqual(['customerId'])
    expect(await fields({ siteId: site.id })).toEqual(['siteId'])
    expect(await fields({ role: 'technician', siteId: site.id })).toEqual(['customerId'])
    expect(await fields({ role: 'technician', customerId: null })).toEqual(['siteId'])
    expect(await fields({ customerId: site.id })).toEqual(['customerId'])
    expect(await fields({ email: client.email })).toEqual(['email'])
    expect(await fields({ email: client.email.toUpperCase() })).toEqual(['email'])
    expect(await fields({ role: 'owner' })).toEqual(['role'])
    expect(await fields({ state: 'active' })).toEqual(['body'])
  })

  it('sends who has not come yet a new link, and makes one person of two at once', async () => {
    const { manager, customer } = await buildHouse()
    const agent = await app.agentFor(manager)
    const wanted = { name: 'Lea Roth', email: `lea.${manager.email}`, role: 'client', siteId: null, customerId: customer.id }
    const { body } = await agent.post('/api/people').send(wanted).expect(200)
    expect((await agent.post('/api/people').send({ ...wanted, name: 'Lea Rothe' }).expect(200)).body).toMatchObject({ id: body.id, name: 'Lea Rothe', version: 1 })
    const links = (await eventsOf(body.id)).map((event) => event.data.linkId)
    expect(new Set(links).size).toBe(2)

    const twice = { ...wanted, email: `twice.${manager.email}` }
    const answers = await Promise.all([agent.post('/api/people').send(twice), agent.post('/api/people').send(twice)])
    expect(answers.every(({ status }) => status === 200 || status === 422)).toBe(true)
    expect(await Person.count({ where: { email: twice.email } })).toBe(1)
  })
})

describe('disabling', () => {
  it('needs the version that was seen, happens once, and never to oneself', async () => {
    const { manager, technician } = await buildHouse()
    const agent = await app.agentFor(manager)
    expect((await agent.post(`/api/people/${technician.id}/disable`).send({ version: 3 }).expect(409)).body.code).toBe('already-changed')
    expect((await agent.post(`/api/people/${technician.id}/disable`).send({ version: 0 }).expect(200)).body).toMatchObject({ state: 'disabled', version: 1 })
    expect((await agent.post(`/api/people/${technician.id}/disable`).send({ version: 1 }).expect(409)).body.code).toBe('not-now')
    expect((await agent.post(`/api/people/${manager.id}/disable`).send({ version: 0 }).expect(409)).body.code).toBe('not-now')
    expect((await eventsOf(technician.id)).map((event) => event.type)).toEqual(['person.disabled'])
  })

  it('does not know people of another site, nor who does not exist', async () => {
    const { manager, client, technician } = await buildHouse()
    const other = await buildHouse()
    const agent = await app.agentFor(manager)
    await agent.post(`/api/people/${other.technician.id}/disable`).send({ version: 0 }).expect(404)
    await agent.post(`/api/people/${manager.id.replace(/.$/, (last) => (last === '0' ? '1' : '0'))}/disable`).send({ version: 0 }).expect(404)
    await (await app.agentFor(client)).post(`/api/people/${technician.id}/disable`).send({ version: 0 }).expect(403)
  })
})

describe('granting an authorisation', () => {
  const [method] = methods
  const methodId = method?.id ?? ''

  it('names method, right and last day, and is renewed in place', async () => {
    const { manager, technician } = await buildHouse()
    const agent = await app.agentFor(manager)
    const grant = (until: string) => agent.post(`/api/people/${technician.id}/authorisations`).send({ methodId, right: 'carry out', until, evidence: 'Comparison on block 40-118' })
    expect((await grant(inDays(30)).expect(200)).body.authorisations).toMatchObject([{ methodId, methodTitle: method?.title, right: 'carry out', until: inDays(30) }])
    const { authorisations } = (await grant(inDays(300)).expect(200)).body
    expect(authorisations).toMatchObject([{ until: inDays(300) }])
    expect((await eventsOf(authorisations[0].id)).map((event) => [event.type, event.data.until])).toEqual([['authorisation.granted', inDays(30)], ['authorisation.granted', inDays(300)]])
  })

  it('refuses unknown methods, days past or far away, and people of no site', async () => {
    const { manager, technician, client } = await buildHouse()
    const agent = await app.agentFor(manager)
    const fields = async (change: object) => (await agent.post(`/api/people/${technician.id}/authorisations`).send({ methodId, right: 'review', until: inDays(30), evidence: 'seen', ...change }).expect(422)).body.fields
    expect(await fields({ methodId: 'dowsing' })).toHaveProperty('methodId')
    expect(await fields({ until: inDays(-2) })).toHaveProperty('until')
    expect(await fields({ until: inDays(6 * 366) })).toHaveProperty('until')
    expect(await fields({ right: 'all' })).toHaveProperty('right')
    await agent.post(`/api/people/${client.id}/authorisations`).send({ methodId, right: 'review', until: inDays(30), evidence: 'seen' }).expect(403)
    const other = await buildHouse()
    await agent.post(`/api/people/${other.technician.id}/authorisations`).send({ methodId, right: 'review', until: inDays(30), evidence: 'seen' }).expect(404)
  })
})

describe('listing customers', () => {
  it('shows a client their own organisation, managers all, technicians none', async () => {
    const { client, customer, manager, technician } = await buildHouse()
    const other = await buildHouse()
    const { id, name, address, reportEmail, currency } = customer
    expect((await (await app.agentFor(client)).get('/api/customers').expect(200)).body).toEqual({ items: [{ id, name, address, reportEmail, currency }] })
    const all = (await (await app.agentFor(manager)).get('/api/customers').expect(200)).body.items.map((one: { id: string }) => one.id)
    expect(all).toEqual(expect.arrayContaining([customer.id, other.customer.id]))
    await (await app.agentFor(technician)).get('/api/customers').expect(403)
  })
})
