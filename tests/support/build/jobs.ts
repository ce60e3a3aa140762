import { randomUUID } from 'node:crypto'
import { Payment } from '../../../server/models/billing/payment.ts'
import { Job } from '../../../server/models/jobs/job.ts'
import { MethodOffer } from '../../../server/models/sites/method-offer.ts'
import { settleAs } from '../../../server/services/billing/settle-payment.ts'
import { draftJob } from '../../../server/services/jobs/draft-job.ts'
import { saveDraft } from '../../../server/services/jobs/save-draft.ts'
import type { Job as JobView } from '../../../shared/api/jobs.ts'
import type { Order, OrderSample } from '../../../shared/api/orders.ts'
import { methodOf } from '../../../shared/methods.ts'
import { callerFor } from '../caller.ts'
import type { House } from './house.ts'

/** What the tests' lab charges, in pence before tax. */
export const testPrices: Record<string, number> = { rockwell: 1800, tensile: 8400, 'grain-intercept': 6200 }

/** Lets a site offer these methods at the tests' prices. */
export async function buildOffers(siteId: string, methodIds: readonly string[] = Object.keys(testPrices)): Promise<void> {
  for (const methodId of methodIds) {
    const known = await MethodOffer.findOne({ where: { methodId }, raw: true })
    if (known) await MethodOffer.update({ siteIds: [...known.siteIds, siteId] }, { where: { methodId } })
    else await MethodOffer.create({ methodId, priceMinor: testPrices[methodId] ?? 1000, currency: 'GBP', siteIds: [siteId] })
  }
}

/** A bar that every method takes. */
export function buildSampleOrder(wanted: Partial<OrderSample> = {}): OrderSample {
  return { heat: '7K4192', lot: 'B-204', material: '42CrMo4 +QT', piece: { form: 'bar', diameterMm: 60 }, tests: ['h'], overrides: {}, ...wanted }
}

/** An order of Rockwell HRC for every sample; `methodIds` adds columns, each ticked for all. */
export function buildOrder(wanted: Partial<Order> = {}, { count = 2, methodIds = ['rockwell'] }: { count?: number; methodIds?: readonly string[] } = {}): Order {
  const piece = { form: 'bar' as const, diameterMm: 60 }
  const keys = methodIds.map((_id, at) => String.fromCharCode('h'.charCodeAt(0) + at))
  return {
    purchaseOrder: 'BF-88213', neededBy: null, afterwards: 'keep 30 days, then return', siteId: null,
    columns: methodIds.map((methodId, at) => ({ key: keys[at] ?? 'h', methodId, parameters: methodOf(methodId)?.suggest(piece) ?? {}, requirement: null })),
    samples: Array.from({ length: count }, (_one, at) => buildSampleOrder({ lot: `B-${204 + at}`, tests: keys })),
    ...wanted,
  }
}

/** A draft of the house's client, saved with this order. */
export async function buildDraft({ client, site }: Pick<House, 'client' | 'site'>, order: Order = buildOrder()): Promise<JobView> {
  const caller = await callerFor(client)
  const draft = await draftJob({}, caller)
  return saveDraft(draft.id, { version: draft.version, order: { ...order, siteId: order.siteId ?? site.id } }, caller)
}

/** A job that was paid by card and placed at the house's site, with its samples still to come. The house must offer its methods. */
export async function buildPlacedJob(house: Pick<House, 'client' | 'site'>, order: Order = buildOrder()): Promise<Job> {
  const draft = await buildDraft(house, order)
  await payDraft(draft)
  const job = await Job.findByPk(draft.id, { raw: true })
  if (job?.state !== 'placed') throw new Error(`the job was not placed but is ${job?.state}`)
  return job
}

/** As if the draft's payment page had been opened and paid. */
export async function payDraft({ id: jobId, siteId, customerId, totalMinor: amountMinor, currency, version: jobVersion, number }: JobView): Promise<void> {
  const checkoutId = `cs_test_${randomUUID()}`
  await Job.update({ waitsForPayment: true }, { where: { id: jobId } })
  await Payment.create({ jobId, siteId, customerId, amountMinor, currency, jobVersion, state: 'open', checkoutId, url: 'http://127.0.0.1:9/pay' })
  await settleAs({ id: checkoutId, status: 'complete', paid: true, paymentIntentId: `pi_${randomUUID()}`, amountMinor, currency, reference: number, url: null }, { person: null, requestId: 'test' })
}
