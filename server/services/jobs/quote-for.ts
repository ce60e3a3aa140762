import type { Order, Quote } from '../../../shared/api/orders.ts'
import { orderFaults } from '../../../shared/orders/order-faults.ts'
import { priceOf } from '../../../shared/orders/price-of.ts'
import { sitesFor } from '../../../shared/orders/sites-for.ts'
import type { OrderTerms } from './order-terms.ts'
import { promiseForOrder } from './promise-for-order.ts'

/** Price, faults and promise of an order. Nothing is promised while something has to be put right. */
export async function quoteFor(order: Order, terms: OrderTerms, now: Date): Promise<Quote> {
  const faults = orderFaults(order, terms.offers)
  const choices = sitesFor(order, terms.offers, terms.sites)
  const asked = choices.filter(({ siteId, able }) => able && (order.siteId === null || order.siteId === siteId)).map(({ siteId }) => siteId)
  const promises = faults.length > 0 ? [] : await promiseForOrder(order, asked, now)
  const best = promises.flatMap(({ finish, ...promise }) => (finish ? [{ ...promise, finish }] : [])).sort((a, b) => a.finish.getTime() - b.finish.getTime())[0]
  const name = (siteId: string) => terms.sites.find(({ id }) => id === siteId)?.name ?? ''
  return {
    ...priceOf(order, terms.offers, terms.taxPercent),
    currency: terms.currency,
    faults,
    sites: choices.map(({ siteId, name: siteName, because }) => {
      const promise = promises.find((one) => one.siteId === siteId)
      return { siteId, name: siteName, finish: promise?.finish?.toISOString() ?? null, because: promise?.because ?? because }
    }),
    promise: best ? { siteId: best.siteId, siteName: name(best.siteId), finish: best.finish.toISOString(), receiveBy: best.receiveBy.toISOString() } : null,
  }
}
