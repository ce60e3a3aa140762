import { mean } from './mean.ts'
import { sum } from './sum.ts'

/**
 * Sample standard deviation, s = √(Σ(x − x̄)² / (n − 1)), in the unit of the values; two or more values. Two passes with
 * the correction for a mean that is itself rounded.
 * @example standardDeviation([45.1, 45.3, 45.4]) // 0.152752…
 */
export function standardDeviation(values: ArrayLike<number>): number {
  if (values.length < 2) throw new RangeError('a standard deviation needs at least two values')
  const centre = mean(values)
  const deviations = Array.from(values, (value) => value - centre)
  const squares = sum(deviations.map((d) => d * d)) - sum(deviations) ** 2 / values.length
  return Math.sqrt(Math.max(0, squares) / (values.length - 1))
}
