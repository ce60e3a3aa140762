import { standardDeviation } from '../../../shared/statistics/standard-deviation.ts'
import { mean } from '../../../shared/statistics/mean.ts'
import { tQuantile } from '../../../shared/statistics/t-quantile.ts'

/** Nobody counts more fields than this; a wider scatter has another cure. */
const most = 200

/**
 * How many fields would bring the 95 % confidence interval of the mean down to `percent` of it, if the fields still to come scatter as
 * those counted: the least n with t s/√n ≤ percent · mean / 100. Undefined for fewer than two fields or when more than 200 would be needed.
 * @example fieldsWanted([50, 60, 55], 10) // 6
 */
export function fieldsWanted(values: readonly number[], percent: number): number | undefined {
  if (values.length < 2) return undefined
  const deviation = standardDeviation(values)
  const allowed = (percent / 100) * mean(values)
  for (let n = values.length; n <= most; n++) if ((tQuantile(0.975, n - 1) * deviation) / Math.sqrt(n) <= allowed) return n
  return undefined
}
