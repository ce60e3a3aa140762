import { mean } from './mean.ts'
import { sum } from './sum.ts'

/**
 * Autocorrelation of neighbours, r₁ = Σ(xᵢ − x̄)(xᵢ₊₁ − x̄) / Σ(xᵢ − x̄)², as NIST StRD defines it; no unit. Two or more
 * values that are not all equal, else undefined.
 * @example lag1Autocorrelation([10000001, 10000003, 10000002]) // -0.5
 */
export function lag1Autocorrelation(values: ArrayLike<number>): number | undefined {
  if (values.length < 2) return undefined
  const centre = mean(values)
  const deviations = Array.from(values, (value) => value - centre)
  const squares = sum(deviations.map((d) => d * d))
  if (squares === 0) return undefined
  return sum(deviations.map((d, i) => d * (deviations[i + 1] ?? 0))) / squares
}
