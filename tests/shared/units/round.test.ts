import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { difference } from '../../../shared/units/difference.ts'
import { roundNumber } from '../../../shared/units/round-number.ts'
import { round } from '../../../shared/units/round.ts'
import { significant } from '../../../shared/units/significant.ts'

const rules = fc.constantFrom('half-even' as const, 'half-up' as const)
const increments = fc.constantFrom('0.001', '0.05', '0.1', '0.25', '0.5', '1', '2.5', '5', '10', '0.3')
const decimals = fc.tuple(fc.bigInt(-(10n ** 25n), 10n ** 25n), fc.integer({ min: 0, max: 12 })).map(([digits, places]) => written(digits, places))

describe('round', () => {
  it('is the nearest multiple, by whole numbers that never lose a digit', () => {
    fc.assert(fc.property(decimals, increments, rules, (value, increment, rule) => {
      const scale = 12
      const v = whole(value, scale)
      const step = whole(increment, scale)
      const rounded = whole(round(value, increment, rule), scale)
      const apart = rounded > v ? rounded - v : v - rounded
      expect(rounded % step).toBe(0n)
      expect(apart * 2n <= step).toBe(true)
      if (apart * 2n === step) {
        if (rule === 'half-even') expect((rounded / step) % 2n).toBe(0n)
        else expect((rounded > v) === v > 0n).toBe(true)
      }
    }))
  })
  it('changes nothing when repeated', () => {
    fc.assert(fc.property(decimals, increments, rules, (value, increment, rule) => {
      const once = round(value, increment, rule)
      expect(round(once, increment, rule)).toBe(once)
    }))
  })
  it('never turns two values round', () => {
    fc.assert(fc.property(fc.double({ min: -1e6, max: 1e6, noNaN: true }), fc.double({ min: -1e6, max: 1e6, noNaN: true }), increments, (a, b, increment) => {
      expect(roundNumber(Math.min(a, b), increment)).toBeLessThanOrEqual(roundNumber(Math.max(a, b), increment))
    }))
  })
  it('sees a tie behind binary noise', () => {
    expect(round((62.2 + 62.3) / 2, '0.1')).toBe('62.2')
    expect(round(0.1 + 0.7, '0.1')).toBe('0.8')
    expect(round(62.249999999999986, '0.1')).toBe('62.2')
    expect(round(1.005 * 100, '1')).toBe('100')
  })
  it('writes the increment\'s decimals and no negative zero', () => {
    expect(round('7', '0.05')).toBe('7.00')
    expect(round('7', '0.50')).toBe('7.00')
    expect(round('-0.02', '0.1')).toBe('0.0')
    expect(round('+3', '2')).toBe('4')
  })
  it.each(['abc', '', '1e3', '.5', '1.', 'NaN', 'Infinity', '0x10', ' 1', '1,5'])('refuses %j as a value', (text) => {
    expect(() => round(text, '1')).toThrow(RangeError)
  })
  it.each(['0', '0.00', '-0.1', '', 'x'])('refuses %j as an increment', (text) => {
    expect(() => round('1', text)).toThrow(RangeError)
  })
  it('refuses numbers that are none', () => {
    expect(() => round(NaN, '1')).toThrow(RangeError)
    expect(() => round(Infinity, '1')).toThrow(RangeError)
  })
})

describe('significant figures', () => {
  it.each([[17.36, 3, '17.4'], [0.05747126, 3, '0.0575'], [1234, 3, '1230'], [9.996, 3, '10.0'], [0.0009999, 3, '0.00100'], [0, 3, '0.00'], [-45.25, 3, '-45.2'], [99999, 2, '100000']])('writes %d to %d figures', (value, figures, text) => {
    expect(significant(value, figures)).toBe(text)
  })
})

describe('difference', () => {
  it('is exact in decimals', () => {
    expect(difference(26.4, 25.4)).toBe(1)
    expect(difference(0.3, 0.1)).toBe(0.2)
    expect(difference(45.266666666666666, 45)).toBeCloseTo(0.2666666666667, 10)
  })
})

function whole(text: string, scale: number): bigint {
  const [integer = '', fraction = ''] = text.replace('-', '').split('.')
  const digits = BigInt(integer + fraction.padEnd(scale, '0'))
  return text.startsWith('-') ? -digits : digits
}

function written(digits: bigint, places: number): string {
  const text = (digits < 0n ? -digits : digits).toString().padStart(places + 1, '0')
  const at = text.length - places
  return `${digits < 0n ? '-' : ''}${text.slice(0, at)}${places ? `.${text.slice(at)}` : ''}`
}
