import type { Order, Quote } from '../../../shared/api/orders.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { orderTerms } from './order-terms.ts'
import { quoteFor } from './quote-for.ts'

/** Price, faults and promise of an order while it is typed; nothing is kept. */
export async function quoteOrder(order: Order, caller: Caller): Promise<Quote> {
  const { customerId } = caller.person
  if (!customerId) throw new Problem('not-allowed', 'only a customer can order')
  return quoteFor(order, await orderTerms(customerId), new Date())
}
