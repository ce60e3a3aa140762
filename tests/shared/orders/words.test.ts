import { describe, expect, it } from 'vitest'
import type { OrderSample } from '../../../shared/api/orders.ts'
import { lateDays } from '../../../shared/orders/late-days.ts'
import { notYetReportable } from '../../../shared/orders/not-yet-reportable.ts'
import { sitesFor } from '../../../shared/orders/sites-for.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { wordsFor } from '../../../shared/orders/words-for.ts'

const column = { key: 'h', methodId: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, requirement: null }
const bar: OrderSample = { heat: '', lot: '', material: '42CrMo4 +QT', piece: { form: 'bar', diameterMm: 60 }, tests: ['h'], overrides: {} }

describe('a size', () => {
  it.each([
    [{ form: 'bar' as const, diameterMm: 60 }, 'Ø 60'], [{ form: 'forging' as const, thicknessMm: 45, widthMm: 90 }, '45 × 90'], [{ form: 'sheet' as const, thicknessMm: 0.8 }, '0.80'],
    [{ form: 'tube' as const, diameterMm: 60.3, thicknessMm: 5 }, 'Ø 60.3 × 5'], [{ form: 'casting' as const }, ''],
  ])('reads as the trade writes it: %j', (piece, text) => expect(sizeText(piece)).toBe(text))
})

describe('an order in words', () => {
  it('says number, material and shape as far as they are common', () => {
    const what = (...samples: OrderSample[]) => wordsFor({ columns: [column], samples }).what
    expect(what(bar, bar)).toBe('2 samples, 42CrMo4 +QT, bar Ø 60')
    expect(what(bar, { ...bar, material: 'C45', piece: { form: 'bar', diameterMm: 32 } })).toBe('2 samples, 42CrMo4 +QT and C45, bar')
    expect(what(bar, { ...bar, material: 'C45' }, { ...bar, material: 'S355', piece: { form: 'plate', thicknessMm: 12 } })).toBe('3 samples, 42CrMo4 +QT and 2 more materials')
    expect(what({ ...bar, material: '' })).toBe('1 sample, bar Ø 60')
    expect(what()).toBe('')
  })

  it('names each test once, in the middle of a sentence', () => {
    const grain = { key: 'g', methodId: 'grain-intercept', parameters: { standard: 'ASTM E112' }, requirement: null }
    const both = { ...bar, tests: ['g', 'h'] }
    const { tests } = wordsFor({ columns: [column, grain], samples: [bar, both, both] })
    expect(tests).toMatch(/^Rockwell HRC, grain/)
    expect(wordsFor({ columns: [grain, column], samples: [both] }).tests).toMatch(/^Grain .*, Rockwell HRC$/)
  })
})

describe('sites', () => {
  it('come with those first that do everything, and the others say what they lack', () => {
    const offers = [{ methodId: 'rockwell', priceMinor: 1, currency: 'GBP', siteIds: ['b'] }]
    const sites = [{ id: 'a', name: 'A', address: '', timeZone: 'UTC' }, { id: 'b', name: 'B', address: '', timeZone: 'UTC' }]
    expect(sitesFor({ columns: [column], samples: [bar], siteId: null }, offers, sites)).toEqual([
      { siteId: 'b', name: 'B', able: true, because: 'all tests are done here' }, { siteId: 'a', name: 'A', able: false, because: 'does not offer Rockwell HRC' },
    ])
  })
})

describe('a job', () => {
  it('is late by whole days after the day it is due', () => {
    expect([lateDays('2026-03-28', '2026-03-30'), lateDays('2026-03-30', '2026-03-30'), lateDays('2026-03-31', '2026-03-30'), lateDays(null, '2026-03-30'), lateDays('2026-02-28', '2026-03-01')]).toEqual([2, 0, 0, 0, 1])
  })

  it('says why it cannot be reported yet', () => {
    const tests = [{ state: 'accepted' as const }, { state: 'recorded' as const }, { state: 'void' as const }]
    expect(notYetReportable({ state: 'in work', holds: 0, tests })).toBe('1 of 2 tests are not accepted yet')
    expect(notYetReportable({ state: 'in work', holds: 1, tests: [] })).toBe('a hold is still open')
    expect(notYetReportable({ state: 'in work', holds: 0, tests: [{ state: 'void' }] })).toBe('no test of this job is left to report')
    expect(notYetReportable({ state: 'in review', holds: 0, tests: [{ state: 'accepted' }, { state: 'void' }] })).toBe('')
  })
})
