import type { MethodOffer, Site } from '../api/evaluations.ts'
import type { Order } from '../api/orders.ts'
import { orderedTests } from './ordered-test.ts'

/** A site as a choice for an order: whether it does every test of it, and the reason in a sentence. */
export type SiteChoice = { siteId: string; name: string; able: boolean; because: string }

/** Every site, those that do all tests of the order first. */
export function sitesFor(order: Pick<Order, 'columns' | 'samples' | 'siteId'>, offers: readonly MethodOffer[], sites: readonly Site[]): SiteChoice[] {
  const wanted = new Map(order.samples.flatMap((sample) => orderedTests(order, sample)).map(({ column, label }) => [column.methodId, label]))
  const choices = sites.map(({ id, name }): SiteChoice => {
    const missing = [...wanted].filter(([methodId]) => !offers.some((offer) => offer.methodId === methodId && offer.siteIds.includes(id))).map(([, label]) => label)
    return { siteId: id, name, able: missing.length === 0, because: missing.length === 0 ? 'all tests are done here' : `does not offer ${missing.join(', ')}` }
  })
  return [...choices.filter(({ able }) => able), ...choices.filter(({ able }) => !able)]
}
