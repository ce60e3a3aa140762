import { describe, expect, it } from 'vitest'
import type { Order, OrderSample } from '../../../shared/api/orders.ts'
import { orderFaults } from '../../../shared/orders/order-faults.ts'

const site = '0198c0de-0000-7000-8000-000000000001'
const offers = [{ methodId: 'rockwell', priceMinor: 1800, currency: 'GBP', siteIds: [site] }]
const hrc = { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }
const bar: OrderSample = { heat: '', lot: '', material: 'C45', piece: { form: 'bar', diameterMm: 60 }, tests: ['h'], overrides: {} }
const order = (change: Partial<Order> = {}): Order => ({
  purchaseOrder: '', neededBy: null, afterwards: 'return at once', siteId: null,
  columns: [{ key: 'h', methodId: 'rockwell', parameters: hrc, requirement: null }], samples: [bar], ...change,
})
const places = (wanted: Order) => orderFaults(wanted, offers).map(({ row, column, field }) => [row, column, field])

describe('an order', () => {
  it('without faults has none, and two samples of one heat and lot are no fault', () => {
    expect(orderFaults(order({ samples: [bar, bar] }), offers)).toEqual([])
  })

  it('needs samples, and each sample a material, a size and a test', () => {
    expect(places(order({ samples: [] }))).toEqual([[null, null, 'samples']])
    expect(places(order({ samples: [{ ...bar, material: '', tests: [] }] }))).toEqual([[0, null, 'material'], [0, null, 'tests']])
    expect(places(order({ samples: [bar, { ...bar, piece: { form: 'bar' } }] }))).toEqual([[1, null, 'piece.diameterMm']])
  })

  it.each([
    [{ form: 'bar' as const }, 'a bar needs its diameter, or thickness and width'],
    [{ form: 'tube' as const, diameterMm: 60 }, 'a tube needs its diameter and thickness'],
    [{ form: 'sheet' as const, widthMm: 60 }, 'a sheet needs its thickness'],
    [{ form: 'forging' as const }, 'a forging needs its diameter, or thickness'],
    [{ form: 'tube' as const, diameterMm: 10, thicknessMm: 6 }, 'a wall of 6 mm is more than half of the diameter of 10 mm'],
  ])('says what size is missing: %j', (piece, message) => {
    expect(orderFaults(order({ samples: [{ ...bar, piece }] }), offers).map((fault) => fault.message)).toEqual([message])
  })

  it('names the column of parameters that its method does not know, once for all rows', () => {
    const wrong = order({ columns: [{ key: 'h', methodId: 'rockwell', parameters: { ...hrc, scale: 'HRX' }, requirement: null }], samples: [bar, bar] })
    expect(places(wrong)).toEqual([[null, 'h', 'parameters.scale']])
    const row = order({ samples: [bar, { ...bar, overrides: { h: { scale: 'HRX' } } }] })
    expect(places(row)).toEqual([[1, 'h', 'overrides.h.scale']])
  })

  it('names methods nobody has, offers, or has at this site', () => {
    expect(places(order({ columns: [{ key: 'h', methodId: 'guess', parameters: {}, requirement: null }] }))).toEqual([[null, 'h', 'methodId']])
    expect(orderFaults(order(), []).map(({ message }) => message)).toEqual(['Rockwell hardness is not in the price list'])
    expect(places(order({ siteId: '0198c0de-0000-7000-8000-000000000002' }))).toEqual([[null, 'h', 'siteId']])
  })

  it('limits only what the method reports', () => {
    const limited = (key: string) => order({ columns: [{ key: 'h', methodId: 'rockwell', parameters: hrc, requirement: { rule: 'simple', limits: [{ key, lower: 29 }] } }] })
    expect(places(limited('mean'))).toEqual([])
    expect(places(limited('tensileStrength'))).toEqual([[null, 'h', 'requirement']])
  })

  it('names the row and column of a size that the method cannot take, with ways out that mend it', () => {
    const thin: OrderSample = { ...bar, piece: { form: 'sheet', thicknessMm: 0.4 } }
    const [fault] = orderFaults(order({ samples: [bar, thin] }), offers)
    expect(fault).toMatchObject({ row: 1, column: 'h', field: 'tests' })
    expect(fault?.cures.length).toBeGreaterThan(0)
    for (const cure of fault?.cures ?? []) expect(orderFaults(order({ samples: [bar, { ...thin, overrides: { h: cure.parameters } }] }), offers)).toEqual([])
  })

  it('finds columns with one key and ticks for no column', () => {
    const [column] = order().columns
    expect(places({ ...order(), columns: column ? [column, { ...column }] : [] })).toEqual([[null, 'h', 'key']])
    expect(places(order({ samples: [{ ...bar, tests: ['h', 'z'] }] }))).toEqual([[0, 'z', 'tests']])
  })
})
