import { deviationsFrom } from './deviations-from.ts'
import { sum } from './sum.ts'

/**
 * Arithmetic mean, in the unit of the values; one or more values. The second pass takes off the rounding error of the first.
 * @example mean([45.1, 45.3, 45.4]) // 45.266666…
 */
export function mean(values: ArrayLike<number>): number {
  if (values.length === 0) throw new RangeError('the mean needs at least one value')
  const first = sum(values) / values.length
  return first + sum(deviationsFrom(values, first)) / values.length
}
