import { expanded } from '../method/expanded.ts'
import { listed } from '../method/listed.ts'
import type { DerivationStep, Result, UncertaintyComponent } from '../method/method.ts'
import { sum } from '../statistics/sum.ts'
import { round } from '../units/round.ts'
import { significant } from '../units/significant.ts'
import type { FieldConfidence } from './field-confidence.ts'
import { grainRules, grainSizeNumber, perDecade, type GrainStandard } from './grain-size-number.ts'

export type Counted = { lengthsMm: readonly number[]; counts: readonly number[]; what: 'intersections' | 'intercepts' }

/** Pooled intercepts per mm, mean intercept and G; for two fields or more with the confidence of both and the relative accuracy. */
export function grainInterceptResults(
  { lengthsMm, counts, what }: Counted, standard: GrainStandard, confidence: FieldConfidence | undefined, uncertainty: { components: UncertaintyComponent[] } | undefined,
): Result[] {
  const { edition, constant } = grainRules[standard]
  const count = sum(counts)
  const length = sum(lengthsMm)
  if (!(count > 0)) throw new RangeError(`no ${what} were counted: there is no grain size`)
  const perMm = count / length
  const size = grainSizeNumber(perMm, standard)
  const fields: DerivationStep = { text: `${counts.length} fields: ${what} ${listed(counts)} on lines of ${listed(lengthsMm)} mm` }
  const pooled: DerivationStep = { text: `all ${what} over all line`, formula: `N_L = ${short(count)} / ${short(length)} mm`, value: perMm, unit: '1/mm' }
  const result = (key: string, symbol: string, value: number, unit: string, steps: DerivationStep[], rounding: string, rounded: string, reported = said(rounded, unit)): Result => ({
    key, symbol, value, unit, reported, basis: edition, approximate: false,
    derivation: [...steps, { text: rounding, value: Number(rounded), unit, reported }],
  })
  const figures = 'rounded to three figures, half to even'
  const spread = confidence && { standardUncertainty: perDecade / Math.LN10 * (confidence.standardError / confidence.mean), degreesOfFreedom: confidence.degreesOfFreedom }
  const whole = expanded(uncertainty, spread, '')
  const toG = (value: string) => `6.643856 log10(${value}) − ${constant}`
  const grainSize = result('grainSize', 'G', size, '', [
    fields, pooled, { text: 'grain size number', formula: `G = ${toG('N_L')} = ${toG(short(perMm))}`, clause: edition, value: size }, ...(whole ? [whole.step] : []),
  ], 'rounded to 0.1, half to even', round(size, '0.1'), `G ${round(size, '0.1')}`)
  if (whole) Object.assign(grainSize, { expandedUncertainty: whole.expandedUncertainty, coverageFactor: whole.coverageFactor })
  const results = [
    result('interceptsPerMm', 'N_L', perMm, '1/mm', [fields, pooled], figures, significant(perMm, 3)),
    result('meanIntercept', 'l', 1 / perMm, 'mm', [fields, pooled, { text: 'mean intercept', formula: 'l = 1 / N_L', value: 1 / perMm, unit: 'mm' }], figures, significant(1 / perMm, 3)),
    grainSize,
  ]
  if (!confidence) return results
  const { mean, standardError, degreesOfFreedom, t, halfWidth, relativeAccuracy } = confidence
  const interval: DerivationStep = {
    text: `95 % confidence of the mean of N_L over fields, t for ${degreesOfFreedom} degrees of freedom`,
    formula: `t s/√n = ${short(t)} × ${short(standardError)}`, clause: `${edition}, statistical analysis`, value: halfWidth, unit: '1/mm',
  }
  if (halfWidth < mean) {
    const onG = (grainSizeNumber(mean + halfWidth, standard) - grainSizeNumber(mean - halfWidth, standard)) / 2
    results.push(result('confidence95', 'CI', onG, '', [fields, interval, {
      text: 'carried to G: half the distance between G at both ends', formula: `G(${short(mean)} ± ${short(halfWidth)})`, value: onG,
    }], 'rounded to 0.01, half to even', round(onG, '0.01'), `± ${round(onG, '0.01')}`))
  }
  results.push(result('relativeAccuracy', '%RA', relativeAccuracy, '%', [fields, interval, {
    text: 'relative accuracy', formula: `100 × ${short(halfWidth)} / ${short(mean)}`, value: relativeAccuracy, unit: '%',
  }], 'rounded to 0.1 %, half to even', round(relativeAccuracy, '0.1')))
  return results
}

function said(rounded: string, unit: string): string {
  return unit === '' ? rounded : `${rounded} ${unit === '1/mm' ? '/mm' : unit}`
}

function short(value: number): string {
  return String(Number(value.toPrecision(6)))
}
