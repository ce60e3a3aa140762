import type { DerivationStep, Result, ResultName } from '../method/method.ts'
import type { Expanded } from '../method/expanded.ts'
import { listed } from '../method/listed.ts'
import { extremes } from '../statistics/extremes.ts'
import { mean } from '../statistics/mean.ts'
import { standardDeviation } from '../statistics/standard-deviation.ts'
import { round } from '../units/round.ts'

/** The five results of a set of hardness values, in their order. */
export function hardnessResultNames(symbol: string, unit: string, decimals: number): ResultName[] {
  return [
    { key: 'mean', symbol, name: 'Mean hardness', unit, decimals },
    { key: 'range', symbol: 'R', name: 'Range', unit, decimals },
    { key: 'minimum', symbol: 'min', name: 'Lowest', unit, decimals },
    { key: 'maximum', symbol: 'max', name: 'Highest', unit, decimals },
    { key: 'standardDeviation', symbol: 's', name: 'Standard deviation', unit, decimals: decimals + 1 },
  ]
}

export type HardnessSet = {
  values: readonly number[]
  /** The scale or symbol, 'HRC'; also the unit. */
  scale: string
  /** How a value of this scale is rounded, and how that is said, as the standard puts it. */
  increment: string
  rounding: DerivationStep
  /** The standard with its edition. */
  basis: string
  /** How the values came about, before they are put together. */
  steps: DerivationStep[]
  uncertainty?: Expanded
}

/** Mean, range, lowest, highest and, for two values or more, the standard deviation of hardness values. */
export function hardnessResults({ values, scale, increment, rounding, basis, steps, uncertainty }: HardnessSet): Result[] {
  const { minimum, maximum, range } = extremes(values)
  const n = values.length
  const result = (key: string, symbol: string, value: number, step: DerivationStep, last: DerivationStep, reported: string, more: DerivationStep[] = []): Result => ({
    key, symbol, value, unit: scale, reported, basis, approximate: false,
    derivation: [...steps, { ...step, value, unit: scale }, ...more, { ...last, value: Number.parseFloat(reported), unit: scale, reported }],
  })
  const rounded = (value: number) => `${round(value, increment)} ${scale}`
  const centre = mean(values)
  const main = result('mean', scale, centre, { text: `mean of ${n} reading${n === 1 ? '' : 's'}`, formula: `(${listed(values).replaceAll(', ', ' + ')}) / ${n}` },
    rounding, rounded(centre), uncertainty ? [uncertainty.step] : [])
  if (uncertainty) {
    main.expandedUncertainty = uncertainty.expandedUncertainty
    main.coverageFactor = uncertainty.coverageFactor
  }
  const results = [
    main,
    result('range', 'R', range, { text: 'highest less lowest', formula: `${listed([maximum])} − ${listed([minimum])}` }, rounding, rounded(range)),
    result('minimum', 'min', minimum, { text: `lowest of ${n}` }, rounding, rounded(minimum)),
    result('maximum', 'max', maximum, { text: `highest of ${n}` }, rounding, rounded(maximum)),
  ]
  if (n > 1) {
    const deviation = standardDeviation(values)
    results.push(result('standardDeviation', 's', deviation, { text: `standard deviation of ${n} readings`, formula: 's = √(Σ(x − x̄)² / (n − 1))' },
      { text: 'rounded to 0.01, half to even' }, `${round(deviation, '0.01')} ${scale}`))
  }
  return results
}
