import type { Order } from '../../../shared/api/orders.ts'

/** When a site would be done with an order, if it can be said: `receiveBy` is when its samples have to be there for that. */
export type SitePromise = { siteId: string; finish: Date; receiveBy: Date; because: string }

/** The earliest finish of an order at each of these sites, beside all that is planned there already. A site is left out when nothing can be promised for it. */
export async function promiseForOrder(_order: Order, _siteIds: readonly string[], _now: Date): Promise<SitePromise[]> {
  return Promise.resolve([])
}
