import { describe, expect, it } from 'vitest'
import type { OrderSample } from '../../../shared/api/orders.ts'
import { priceOf } from '../../../shared/orders/price-of.ts'

const offer = (priceMinor: number) => [{ methodId: 'rockwell', priceMinor, currency: 'GBP', siteIds: [] }]
const column = { key: 'h', methodId: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, requirement: null }
const bar: OrderSample = { heat: '', lot: '', material: 'C45', piece: { form: 'bar', diameterMm: 60 }, tests: ['h'], overrides: {} }
const none = { ...bar, tests: [] }
const light = { ...bar, overrides: { h: { scale: 'HR15N' } } }

describe('the price of an order', () => {
  it('has a line for each test as it is called and a price for each row', () => {
    const price = priceOf({ columns: [column], samples: [bar, light, none, bar] }, offer(1800), 20)
    expect(price.lines).toEqual([{ name: 'Rockwell HRC', count: 2, unitMinor: 1800, totalMinor: 3600 }, { name: 'Rockwell HR15N', count: 1, unitMinor: 1800, totalMinor: 1800 }])
    expect(price).toMatchObject({ rowMinor: [1800, 1800, 0, 1800], netMinor: 5400, taxMinor: 1080, totalMinor: 6480 })
  })

  it.each([
    // net, tax %, tax by hand: 0.5 is rounded up, once on the total
    [1, 50, 1], [1, 49, 0], [25, 10, 3], [24, 10, 2], [1995, 20, 399], [1997, 20, 399], [1998, 20, 400], [333, 19, 63], [1000, 0, 0],
  ])('taxes %i at %i %% with %i', (net, percent, tax) => {
    expect(priceOf({ columns: [column], samples: [bar] }, offer(net), percent)).toMatchObject({ netMinor: net, taxMinor: tax, totalMinor: net + tax })
  })

  it('rounds tax once, not row by row', () => {
    // three rows of 3 at 50 %: each would be 1.5 and make 6 rounded; the total 9 makes 4.5
    expect(priceOf({ columns: [column], samples: [bar, bar, bar] }, offer(3), 50).taxMinor).toBe(5)
  })

  it('counts a tick once and one for no column not at all', () => {
    expect(priceOf({ columns: [column], samples: [{ ...bar, tests: ['h', 'h', 'z'] }] }, offer(100), 0).totalMinor).toBe(100)
  })

  it('refuses a tax that is no whole percentage', () => {
    for (const tax of [-1, 101, 17.5, NaN]) expect(() => priceOf({ columns: [], samples: [] }, [], tax)).toThrow(RangeError)
  })
})
