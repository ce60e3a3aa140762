import type { MethodOffer } from '../api/evaluations.ts'
import type { Order, Quote } from '../api/orders.ts'
import { orderedTests } from './ordered-test.ts'

export type Price = Pick<Quote, 'lines' | 'rowMinor' | 'netMinor' | 'taxPercent' | 'taxMinor' | 'totalMinor'>

/**
 * What an order costs, in whole minor units: one line for each test as it is called, each sample's own price, and tax on the
 * total before tax, rounded half up once. A method that is not offered costs nothing here; `orderFaults` refuses it.
 * @example 10 × 1800 and 1 × 8400 at 20 %: net 26400, tax 5280, total 31680
 * @throws RangeError for a tax that is no whole percentage from 0 to 100
 */
export function priceOf(order: Pick<Order, 'columns' | 'samples'>, offers: readonly MethodOffer[], taxPercent: number): Price {
  if (!Number.isInteger(taxPercent) || taxPercent < 0 || taxPercent > 100) throw new RangeError(`tax must be a whole percentage from 0 to 100, not ${taxPercent}`)
  const prices = new Map(offers.map(({ methodId, priceMinor }) => [methodId, priceMinor]))
  const lines = new Map<string, Quote['lines'][number]>()
  const rowMinor = order.samples.map((sample) => {
    let row = 0
    for (const { column, label } of orderedTests(order, sample)) {
      const unitMinor = prices.get(column.methodId) ?? 0
      const key = `${column.methodId} ${label}`
      const line = lines.get(key) ?? { name: label, count: 0, unitMinor, totalMinor: 0 }
      lines.set(key, { ...line, count: line.count + 1, totalMinor: line.totalMinor + unitMinor })
      row += unitMinor
    }
    return row
  })
  const netMinor = rowMinor.reduce((sum, row) => sum + row, 0)
  const taxMinor = Math.floor((netMinor * taxPercent + 50) / 100)
  return { lines: [...lines.values()], rowMinor, netMinor, taxPercent, taxMinor, totalMinor: netMinor + taxMinor }
}
