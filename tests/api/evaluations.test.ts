import { expect, it } from 'vitest'
import { startTestApp } from '../support/app.ts'
import { buildCustomer } from '../support/build/customers.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildOffers } from '../support/build/jobs.ts'
import { buildPerson } from '../support/build/people.ts'

const app = await startTestApp()
const one = { method: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, readings: [{ value: 30 }, { value: 31 }, { value: 32 }] }

it('works out a case, and an array of cases in its order, saying in place what cannot be answered', async () => {
  const agent = await app.agentFor((await buildHouse()).client)
  const { body: single } = await agent.post('/api/evaluate').send(one).expect(200)
  // the mean of 30, 31 and 32
  expect(single.results[0]).toMatchObject({ key: 'mean', value: 31 })
  const { body: several } = await agent.post('/api/evaluate').send([one, { method: 'phrenology' }, { tool: 't-quantile', probability: 2 }]).expect(200)
  expect(several.map((answer: { error?: { code: string } }) => answer.error?.code)).toEqual([undefined, 'unknown-method', 'invalid-input'])
  expect(several[0]).toEqual(single)
})

it('refuses strangers and too many cases at once', async () => {
  await app.agent().post('/api/evaluate').send(one).expect(401)
  const agent = await app.agentFor((await buildHouse()).client)
  await agent.post('/api/evaluate').send(Array(501).fill(1)).expect(413)
})

it('shows a customer the offers in its own currency, and the lab all of them', async () => {
  const house = await buildHouse()
  await buildOffers(house.site.id)
  const { body } = await (await app.agentFor(house.client)).get('/api/catalogue').expect(200)
  expect(body.offers.find(({ methodId }: { methodId: string }) => methodId === 'rockwell')).toMatchObject({ priceMinor: 1800, currency: 'GBP', siteIds: [house.site.id] })
  expect(body.sites).toContainEqual({ id: house.site.id, name: house.site.name, address: house.site.address, timeZone: 'Europe/London' })
  const euro = await buildPerson({ role: 'client', customerId: (await buildCustomer({ currency: 'EUR' })).id })
  expect((await (await app.agentFor(euro)).get('/api/catalogue').expect(200)).body.offers).toEqual([])
  expect((await (await app.agentFor(house.technician)).get('/api/catalogue').expect(200)).body.offers).toHaveLength(3)
})
