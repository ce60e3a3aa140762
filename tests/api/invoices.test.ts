import { Op } from 'sequelize'
import { expect, it } from 'vitest'
import { Invoice } from '../../server/models/billing/invoice.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildDraft, buildOffers, buildOrder, buildPlacedJob, payDraft } from '../support/build/jobs.ts'

const app = await startTestApp()

async function start() {
  const house = await buildHouse()
  await buildOffers(house.site.id)
  return house
}

it('says what was ordered, in whole pence that add up, with who and what for', async () => {
  const house = await start()
  const job = await buildPlacedJob(house, buildOrder({}, { count: 3, methodIds: ['rockwell', 'tensile'] }))
  const agent = await app.agentFor(house.client)
  const { body: list } = await agent.get('/api/invoices').expect(200)
  const { body: invoice } = await agent.get(`/api/invoices/${list.items[0].id}`).expect(200)
  expect(invoice).toMatchObject({ jobNumber: job.number, customerName: house.customer.name, purchaseOrder: 'BF-88213', currency: 'GBP', netMinor: 30600, taxPercent: 20, taxMinor: 6120, totalMinor: 36720, paidMinor: 36720, refundedMinor: 0 })
  expect(invoice.number).toMatch(/^I-\d\d-\d{5}$/)
  for (const { count, unitMinor, totalMinor } of invoice.lines) expect(count * unitMinor).toBe(totalMinor)
  expect(invoice.lines.reduce((sum: number, { totalMinor }: { totalMinor: number }) => sum + totalMinor, 0)).toBe(invoice.netMinor)
})

it('is numbered without a gap, also when many are placed at once and one of them fails', async () => {
  const house = await start()
  await buildPlacedJob(house)
  const before = await numbers()
  const orders = [1, 2, 3, 4].map(() => buildPlacedJob(house))
  // this one has an invoice already, so that its placing fails after it took a number
  const broken = buildDraft(house).then(async (draft) => {
    const { id: jobId, customerId, siteId, currency, lines, netMinor, taxMinor, totalMinor } = draft
    await Invoice.create({ number: 'I-00-00000', jobId, customerId, siteId, issuedOn: '2026-12-01', currency, lines, netMinor, taxPercent: 20, taxMinor, totalMinor, paidMinor: totalMinor })
    return payDraft(draft)
  })
  const results = await Promise.allSettled([...orders, broken])
  expect(results.map(({ status }) => status)).toEqual(['fulfilled', 'fulfilled', 'fulfilled', 'fulfilled', 'rejected'])
  await buildPlacedJob(house)
  const after = await numbers()
  expect(after).toEqual(Array.from({ length: before.length + 5 }, (_one, at) => at + 1))
})

it('comes in parts, and is nobody else\'s', async () => {
  const house = await start()
  for (let count = 0; count < 3; count += 1) await buildPlacedJob(house)
  const agent = await app.agentFor(house.client)
  const { body: first } = await agent.get('/api/invoices?limit=2').expect(200)
  const { body: second } = await agent.get(`/api/invoices?limit=2&after=${first.next}`).expect(200)
  expect([first.items.length, second.items.length, second.next]).toEqual([2, 1, null])
  await agent.get('/api/invoices?after=nonsense').expect(422)
  const stranger = await app.agentFor((await buildHouse()).client)
  await stranger.get(`/api/invoices/${first.items[0].id}`).expect(404)
  expect((await stranger.get('/api/invoices').expect(200)).body.items).toEqual([])
  await (await app.agentFor(house.manager)).get(`/api/invoices/${first.items[0].id}`).expect(200)
  await (await app.agentFor(house.technician)).get(`/api/invoices/${first.items[0].id}`).expect(403)
})

async function numbers(): Promise<number[]> {
  return (await Invoice.findAll({ where: { number: { [Op.ne]: 'I-00-00000' } }, attributes: ['number'], raw: true })).map(({ number }) => Number(number.slice(5))).sort((a, b) => a - b)
}
