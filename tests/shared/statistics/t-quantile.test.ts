import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { tQuantile } from '../../../shared/statistics/t-quantile.ts'

const probabilities = [0.9, 0.95, 0.975, 0.99, 0.995, 0.99865]
/** Degrees of freedom and t at the probabilities above, to four decimals; computed with an independent program, equal to printed tables. */
const printed = [
  [1, 3.0777, 6.3138, 12.7062, 31.8205, 63.6567, 235.7837],
  [3, 1.6377, 2.3534, 3.1824, 4.5407, 5.8409, 9.2187],
  [4, 1.5332, 2.1318, 2.7764, 3.7469, 4.6041, 6.6201],
  [6, 1.4398, 1.9432, 2.4469, 3.1427, 3.7074, 4.9040],
  [7, 1.4149, 1.8946, 2.3646, 2.9980, 3.4995, 4.5299],
  [9, 1.3830, 1.8331, 2.2622, 2.8214, 3.2498, 4.0942],
  [10, 1.3722, 1.8125, 2.2281, 2.7638, 3.1693, 3.9569],
  [12, 1.3562, 1.7823, 2.1788, 2.6810, 3.0545, 3.7642],
  [13, 1.3502, 1.7709, 2.1604, 2.6503, 3.0123, 3.6941],
  [15, 1.3406, 1.7531, 2.1314, 2.6025, 2.9467, 3.5864],
  [16, 1.3368, 1.7459, 2.1199, 2.5835, 2.9208, 3.5441],
  [18, 1.3304, 1.7341, 2.1009, 2.5524, 2.8784, 3.4754],
  [19, 1.3277, 1.7291, 2.0930, 2.5395, 2.8609, 3.4472],
  [21, 1.3232, 1.7207, 2.0796, 2.5176, 2.8314, 3.3997],
  [22, 1.3212, 1.7171, 2.0739, 2.5083, 2.8188, 3.3795],
  [24, 1.3178, 1.7109, 2.0639, 2.4922, 2.7969, 3.3447],
  [25, 1.3163, 1.7081, 2.0595, 2.4851, 2.7874, 3.3296],
  [27, 1.3137, 1.7033, 2.0518, 2.4727, 2.7707, 3.3030],
  [28, 1.3125, 1.7011, 2.0484, 2.4671, 2.7633, 3.2913],
  [30, 1.3104, 1.6973, 2.0423, 2.4573, 2.7500, 3.2703],
  [40, 1.3031, 1.6839, 2.0211, 2.4233, 2.7045, 3.1987],
  [60, 1.2958, 1.6706, 2.0003, 2.3901, 2.6603, 3.1299],
  [80, 1.2922, 1.6641, 1.9901, 2.3739, 2.6387, 3.0965],
  [120, 1.2886, 1.6577, 1.9799, 2.3578, 2.6174, 3.0637],
  [1000, 1.2824, 1.6464, 1.9623, 2.3301, 2.5808, 3.0075],
]
/** JCGM 100:2008 Table G.2: degrees of freedom and t at these two-sided coverages, to two decimals. */
const coverages = [0.6827, 0.9, 0.95, 0.9545, 0.99, 0.9973]
const tableG2 = [
  [1, 1.84, 6.31, 12.71, 13.97, 63.66, 235.78],
  [3, 1.20, 2.35, 3.18, 3.31, 5.84, 9.22],
  [4, 1.14, 2.13, 2.78, 2.87, 4.60, 6.62],
  [6, 1.09, 1.94, 2.45, 2.52, 3.71, 4.90],
  [7, 1.08, 1.89, 2.36, 2.43, 3.50, 4.53],
  [9, 1.06, 1.83, 2.26, 2.32, 3.25, 4.09],
  [10, 1.05, 1.81, 2.23, 2.28, 3.17, 3.96],
  [16, 1.03, 1.75, 2.12, 2.17, 2.92, 3.54],
  [20, 1.03, 1.72, 2.09, 2.13, 2.85, 3.42],
  [50, 1.01, 1.68, 2.01, 2.05, 2.68, 3.16],
  [100, 1.01, 1.66, 1.98, 2.03, 2.63, 3.08],
]

describe('quantile of Student\'s t', () => {
  it.each(printed)('agrees with the tables at %d degrees of freedom', (freedom, ...values) => {
    values.forEach((value, i) => expect(tQuantile(probabilities[i]!, freedom)).toBeCloseTo(value, 4 - 0.31))
  })
  it.each(tableG2)('agrees with Table G.2 at %d degrees of freedom', (freedom, ...values) => {
    values.forEach((value, i) => expect(Math.abs(tQuantile((1 + coverages[i]!) / 2, freedom) - value)).toBeLessThanOrEqual(0.0051))
  })
  it('has the closed forms of one and two degrees of freedom', () => {
    fc.assert(fc.property(fc.double({ min: 1e-9, max: 0.9999, noNaN: true }), (p) => {
      close(tQuantile(p, 1), p < 0.5 ? -1 / Math.tan(Math.PI * p) : Math.tan(Math.PI * (p - 0.5)), 1e-9)
      close(tQuantile(p, 2), (2 * p - 1) / Math.sqrt(2 * p * (1 - p)))
    }))
  })
  it('is antisymmetric and rises with the probability', () => {
    fc.assert(fc.property(fc.double({ min: 0.001, max: 0.499, noNaN: true }), fc.double({ min: 0.5, max: 1e7, noNaN: true }), (p, v) => {
      close(tQuantile(p, v), -tQuantile(1 - p, v), 1e-9)
      expect(tQuantile(p, v)).toBeLessThan(tQuantile(p + 0.0005, v))
    }))
  })
  it('becomes the normal quantile', () => {
    expect(tQuantile(0.975, Infinity)).toBeCloseTo(1.959963984540054, 12) // Abramowitz and Stegun, table 26.5
    expect(tQuantile(0.975, 1e6)).toBeCloseTo(tQuantile(0.975, 1e6 + 1), 11)
    expect(tQuantile(0.5, 3)).toBe(0)
  })
  it.each([[0, 3], [1, 3], [-0.1, 3], [NaN, 3], [0.9, 0], [0.9, -1], [0.9, NaN]])('refuses probability %d with %d degrees of freedom', (p, v) => {
    expect(() => tQuantile(p, v)).toThrow(RangeError)
  })
})

function close(value: number, expected: number, tolerance = 1e-10): void {
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(tolerance * Math.max(1e-6, Math.abs(expected)))
}
