import type { Order, Quote } from '../../../shared/api/orders.ts'
import type { Currency, JobState, MoneyState } from '../../../shared/api/words.ts'
import { big, day, fallback, flag, instant, integer, json, maybe, ref, text } from '../../database/columns.ts'
import { table, type Row } from '../../database/table.ts'

export const Job = table('Job', 'jobs', {
  number: text(), customerId: ref(), siteId: ref(), orderedById: ref(), state: text<JobState>(), money: text<MoneyState>(), waitsForPayment: fallback(flag(), false), holds: fallback(integer(), 0),
  order: json<Order>(), lines: json<Quote['lines']>(), netMinor: big(), taxMinor: big(), totalMinor: big(), currency: text<Currency>(), purchaseOrder: text(), what: text(), tests: text(), neededBy: maybe(day()),
  placedAt: maybe(instant()), promisedAt: maybe(instant()), expectedAt: maybe(instant()), version: fallback(integer(), 0),
})
export type Job = Row<typeof Job>
