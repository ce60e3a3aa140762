import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { extremes } from '../../../shared/statistics/extremes.ts'
import { lag1Autocorrelation } from '../../../shared/statistics/lag1-autocorrelation.ts'
import { mean } from '../../../shared/statistics/mean.ts'
import { normalProbability } from '../../../shared/statistics/normal.ts'
import { standardDeviation } from '../../../shared/statistics/standard-deviation.ts'

const values = fc.array(fc.double({ min: -1e6, max: 1e6, noNaN: true }), { minLength: 2, maxLength: 60 })

describe('statistics', () => {
  it('shifts and stretches with the values', () => {
    fc.assert(fc.property(values, fc.integer({ min: -1000, max: 1000 }), (list, shift) => {
      const moved = list.map((value) => value * 2 + shift)
      expect(mean(moved)).toBeCloseTo(mean(list) * 2 + shift, 6)
      expect(standardDeviation(moved)).toBeCloseTo(standardDeviation(list) * 2, 6)
    }))
  })
  it('does not mind the order', () => {
    fc.assert(fc.property(values, (list) => {
      const turned = [...list].reverse()
      expect(mean(turned)).toBeCloseTo(mean(list), 7)
      expect(standardDeviation(turned)).toBeCloseTo(standardDeviation(list), 7)
      expect(extremes(turned)).toEqual(extremes(list))
    }))
  })
  it('gives equal values no scatter', () => {
    expect(standardDeviation([0.1, 0.1, 0.1])).toBe(0)
    expect(lag1Autocorrelation([0.1, 0.1, 0.1])).toBeUndefined()
    expect(lag1Autocorrelation([4])).toBeUndefined()
  })
  it('refuses too few values', () => {
    expect(() => mean([])).toThrow(RangeError)
    expect(() => standardDeviation([1])).toThrow(RangeError)
    expect(() => extremes([])).toThrow(RangeError)
  })
  it('takes a million values', () => {
    const many = Array.from({ length: 1_000_000 }, (_, i) => 1e9 + (i % 2))
    expect(mean(many)).toBe(1e9 + 0.5)
    expect(extremes(many).range).toBe(1)
  })
  // Abramowitz and Stegun, table 26.1, and closed form Φ(z) + Φ(−z) = 1
  it.each([[0, 0.5], [1, 0.841344746068543], [2, 0.977249868051821], [-1.96, 0.024997895148220], [3, 0.998650101968370], [-4, 3.167124183311986e-5], [-6, 9.865876450376946e-10]])('has the normal probability of %d', (z, p) => {
    expect(Math.abs(normalProbability(z) - p)).toBeLessThanOrEqual(1e-13 + 1e-12 * p)
    expect(normalProbability(z) + normalProbability(-z)).toBeCloseTo(1, 14)
  })
  it('joins the two ways to the normal probability', () => {
    expect(Math.abs(normalProbability(-3 - 1e-12) / normalProbability(-3 + 1e-12) - 1)).toBeLessThan(1e-10)
  })
})
