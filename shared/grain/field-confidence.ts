import { mean } from '../statistics/mean.ts'
import { standardDeviation } from '../statistics/standard-deviation.ts'
import { tQuantile } from '../statistics/t-quantile.ts'

export type FieldConfidence = {
  mean: number
  standardError: number
  degreesOfFreedom: number
  t: number
  /** Half-width of the 95 % confidence interval of the mean, t s/√n. */
  halfWidth: number
  /** 100 × half-width / mean, %. */
  relativeAccuracy: number
}

/**
 * 95 % confidence interval and relative accuracy of a quantity measured field by field (ASTM E112, statistical analysis): on the measured
 * quantity, never on G. Two fields or more with a mean above 0; else undefined.
 * @example fieldConfidence([14.3, 15.1, 13.8, 14.9, 14.2])?.halfWidth // 0.6605
 */
export function fieldConfidence(values: readonly number[]): FieldConfidence | undefined {
  if (values.length < 2) return undefined
  const centre = mean(values)
  if (!(centre > 0)) return undefined
  const degreesOfFreedom = values.length - 1
  const standardError = standardDeviation(values) / Math.sqrt(values.length)
  const t = tQuantile(0.975, degreesOfFreedom)
  const halfWidth = t * standardError
  return { mean: centre, standardError, degreesOfFreedom, t, halfWidth, relativeAccuracy: (100 * halfWidth) / centre }
}
