import { deviationsFrom } from './deviations-from.ts'
import { mean } from './mean.ts'
import { sum } from './sum.ts'
import { sumOfProducts } from './sum-of-products.ts'

/**
 * Sample standard deviation, s = √(Σ(x − x̄)² / (n − 1)), in the unit of the values; two or more values. Two passes with
 * the correction for a mean that is itself rounded.
 * @example standardDeviation([45.1, 45.3, 45.4]) // 0.152752…
 */
export function standardDeviation(values: ArrayLike<number>): number {
  if (values.length < 2) throw new RangeError('a standard deviation needs at least two values')
  const deviations = deviationsFrom(values, mean(values))
  const squares = sumOfProducts(deviations, deviations) - sum(deviations) ** 2 / values.length
  return Math.sqrt(Math.max(0, squares) / (values.length - 1))
}
