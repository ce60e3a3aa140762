import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { combineUncertainty } from '../../../shared/statistics/combine-uncertainty.ts'
import { conformity } from '../../../shared/statistics/conformity.ts'

describe('conformity', () => {
  // closed form: Φ of the distance to the limits over u = U/2; outcomes by ILAC-G8:09/2019 with w = U
  it.each([
    ['simple', 355, 6, 355, undefined, 'pass', 0.5],
    ['guarded', 361, 6, 355, undefined, 'pass', 0.97725],
    ['guarded', 358, 6, 355, undefined, 'undecided', 0.841345],
    ['guarded', 352, 6, 355, undefined, 'undecided', 0.158655],
    ['guarded', 348.9, 6, 355, undefined, 'fail', 0.021009],
    ['simple', 58.9, 0.8, 58, 62, 'pass', 0.987776],
    ['guarded', 61.5, 0.8, 58, 62, 'undecided', 0.89435],
    ['guarded', 59.0, 0.8, 58, 62, 'pass', 0.99379],
    ['simple', 22.0, 1.5, undefined, 23.0, 'pass', 0.908789],
  ] as const)('%s: %d ± %d between %s and %s', (rule, value, expandedUncertainty, lower, upper, outcome, probability) => {
    const judged = conformity({ value, expandedUncertainty, lower, upper, rule })
    expect(judged.outcome).toBe(outcome)
    expect(judged.guardBand).toBe(rule === 'guarded' ? expandedUncertainty : 0)
    expect(judged.probabilityOfConformity).toBeCloseTo(probability, 5)
  })
  it('takes a value on the limit as it is on paper', () => {
    expect(conformity({ value: 0.1 + 0.2, upper: 0.3, rule: 'simple' }).outcome).toBe('pass')
    expect(conformity({ value: 26.4, expandedUncertainty: 1, lower: 25.4, rule: 'guarded' }).outcome).toBe('pass')
    expect(conformity({ value: 24.4, expandedUncertainty: 1, lower: 25.4, rule: 'guarded' }).outcome).toBe('undecided')
    expect(conformity({ value: 24.3999, expandedUncertainty: 1, lower: 25.4, rule: 'guarded' }).outcome).toBe('fail')
  })
  it('guards nothing without an uncertainty', () => {
    expect(conformity({ value: 100, lower: 1, rule: 'guarded' })).toEqual({ outcome: 'undecided', guardBand: 0 })
  })
  it('never turns a fail into a pass when the requirement is made stronger', () => {
    const number = fc.double({ min: -100, max: 100, noNaN: true })
    fc.assert(fc.property(number, fc.double({ min: 0, max: 20, noNaN: true }), number, fc.double({ min: 0, max: 50, noNaN: true }), fc.constantFrom('simple' as const, 'guarded' as const), (value, expandedUncertainty, lower, stronger, rule) => {
      const order = ['fail', 'undecided', 'pass']
      const before = conformity({ value, expandedUncertainty, lower, rule })
      const after = conformity({ value, expandedUncertainty, lower: lower + stronger, rule })
      expect(order.indexOf(after.outcome)).toBeLessThanOrEqual(order.indexOf(before.outcome))
      expect(after.probabilityOfConformity!).toBeLessThanOrEqual(before.probabilityOfConformity! + 1e-12)
    }))
  })
  it('keeps small probabilities', () => {
    // ILAC-G8:09/2019 Table 1, w = 3 U: 9.87e-10
    expect(conformity({ value: 106, expandedUncertainty: 2, upper: 100, rule: 'simple' }).probabilityOfConformity! / 9.865876e-10).toBeCloseTo(1, 6)
  })
})

describe('combined uncertainty', () => {
  it('agrees with JCGM 100:2008, example H.1', () => {
    const lines = [
      { standardUncertainty: 25, degreesOfFreedom: 18 }, { standardUncertainty: 9.7, degreesOfFreedom: 25.6 },
      { standardUncertainty: 2.9, degreesOfFreedom: 50 }, { standardUncertainty: 16.6, degreesOfFreedom: 2 },
    ]
    const { combined, effectiveDegreesOfFreedom, coverageFactor, expanded } = combineUncertainty(lines, 0.99)
    expect(combined).toBeCloseTo(31.7, 1)
    expect(Math.abs(effectiveDegreesOfFreedom! - 16.7)).toBeLessThan(0.1)
    expect(coverageFactor).toBeCloseTo(2.92, 2)
    expect(Math.round(expanded)).toBe(93)
  })
  it('has k = 2 for the usual confidence and nothing estimated', () => {
    const { effectiveDegreesOfFreedom, coverageFactor, expanded } = combineUncertainty([{ standardUncertainty: 0.3 }, { standardUncertainty: 0.2, sensitivity: -2 }])
    expect(effectiveDegreesOfFreedom).toBeNull()
    expect(coverageFactor).toBeCloseTo(2, 4)
    expect(expanded).toBeCloseTo(1, 4)
  })
  it('does not lose a degree of freedom to binary noise', () => {
    fc.assert(fc.property(fc.integer({ min: 1, max: 200 }), fc.double({ min: 1e-6, max: 1e6, noNaN: true }), (degreesOfFreedom, u) => {
      const one = combineUncertainty([{ standardUncertainty: u, degreesOfFreedom }])
      expect(one.coverageFactor).toBe(combineUncertainty([{ standardUncertainty: 1, degreesOfFreedom: degreesOfFreedom + 0.5 }]).coverageFactor)
    }))
  })
  it('takes a budget of zeros', () => {
    expect(combineUncertainty([{ standardUncertainty: 0, degreesOfFreedom: 3 }]).expanded).toBe(0)
  })
  it('refuses an empty budget', () => expect(() => combineUncertainty([])).toThrow(RangeError))
})
