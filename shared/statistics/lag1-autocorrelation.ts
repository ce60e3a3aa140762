import { deviationsFrom } from './deviations-from.ts'
import { mean } from './mean.ts'
import { sumOfProducts } from './sum-of-products.ts'

/**
 * Autocorrelation of neighbours, r₁ = Σ(xᵢ − x̄)(xᵢ₊₁ − x̄) / Σ(xᵢ − x̄)², as NIST StRD defines it; no unit. Two or more
 * values that are not all equal, else undefined.
 * @example lag1Autocorrelation([10000001, 10000003, 10000002]) // -0.5
 */
export function lag1Autocorrelation(values: ArrayLike<number>): number | undefined {
  if (values.length < 2) return undefined
  const deviations = deviationsFrom(values, mean(values))
  const squares = sumOfProducts(deviations, deviations)
  return squares === 0 ? undefined : sumOfProducts(deviations, deviations.subarray(1), values.length - 1) / squares
}
