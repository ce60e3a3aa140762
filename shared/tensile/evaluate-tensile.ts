import { expanded } from '../method/expanded.ts'
import type { Check, Result, UncertaintyComponent } from '../method/method.ts'
import { extremes } from '../statistics/extremes.ts'
import { analyseCurve, type CurveAnalysis } from './analysis/analyse-curve.ts'
import { curveChecks } from './checks/curve-checks.ts'
import { gaugeLengthChecks } from './checks/gauge-length-checks.ts'
import { sectionChecks } from './checks/section-checks.ts'
import { resultOf, type Found } from './results/basis.ts'
import { atMaximum, elongation, yieldPointExtension } from './results/elongations.ts'
import { reductionOfArea } from './results/reduction-of-area.ts'
import { lowerYield, proofStrength, slope, tensileStrength, upperYield } from './results/strengths.ts'
import { plain, sectionArea } from './section-area.ts'
import type { TensileParameters } from './tensile-parameters.ts'
import type { TensileReadings } from './tensile-readings.ts'

type Input = { parameters: TensileParameters; readings: TensileReadings; uncertainty?: { components: UncertaintyComponent[] } }

/** What the curve says, where there is one and a gauge length to turn extension into strain. */
export function analysisOf(parameters: TensileParameters, readings: TensileReadings): CurveAnalysis | null {
  const gaugeLengthMm = parameters.extensometerGaugeLengthMm ?? parameters.originalGaugeLengthMm
  if (!readings.curve || gaugeLengthMm === undefined) return null
  // a record that never pulls says nothing
  if (!(extremes(readings.curve.forceN).maximum > 0)) return null
  const { offsetPercent, elasticWindow } = parameters
  return analyseCurve({ curve: readings.curve, areaMm2: sectionArea(parameters.section).value, gaugeLengthMm, offsetPercent, elasticWindow })
}

/** All that the readings allow, in the fixed order of keys; the rest is missing, with a check where it was to be expected. */
export function evaluateTensile({ parameters, readings, uncertainty }: Input): { results: Result[]; checks: Check[] } {
  const area = sectionArea(parameters.section)
  const areaMm2 = area.value
  const analysis = analysisOf(parameters, readings)
  const withForce = { ...readings, maximumForceN: readings.maximumForceN ?? highestForce(readings, analysis) }
  const input = { parameters, readings: withForce, areaMm2, analysis }
  const upper = upperYield(input)
  const proof = proofStrength(input)
  const strength = tensileStrength(input)
  const stretch = elongation(input)
  const found: (Found | undefined)[] = [
    { key: 'area', symbol: 'S0', value: areaMm2, unit: 'mm2', quantity: 'area', derivation: area.derivation },
    analysis ? slope(analysis) : undefined,
    proof,
    upper,
    lowerYield(input),
    yieldPointExtension(input),
    strength,
    ...atMaximum(input),
    stretch,
    reductionOfArea(readings, areaMm2),
    yieldRatio(upper ?? proof, strength),
  ]
  const results = found.flatMap((one) => (one ? [resultOf(one, parameters.standard)] : [])).map((one) => (one.key === 'tensileStrength' ? withUncertainty(one, uncertainty) : one))
  const fromCurve = stretch?.quantity === 'elongationByExtensometer'
  const checks = [
    ...(strength || analysis?.yielding ? [] : [noForce]),
    ...sectionChecks(parameters, readings, areaMm2),
    ...gaugeLengthChecks(parameters, readings, areaMm2, fromCurve),
    ...(analysis ? curveChecks(analysis, parameters, readings, areaMm2) : []),
  ]
  return { results, checks }
}

const noForce: Check = { code: 'no-force', severity: 'error', message: 'neither a record that pulls nor a maximum force: no tensile strength' }

/** Without a gauge length the record still knows its highest force. */
function highestForce({ curve }: TensileReadings, analysis: CurveAnalysis | null): number | undefined {
  if (!curve || analysis) return undefined
  const { maximum } = extremes(curve.forceN)
  return maximum > 0 ? maximum : undefined
}

/** Rp, or ReH where yielding is discontinuous, over Rm. */
function yieldRatio(yieldStress: Found | undefined, strength: Found | undefined): Found | undefined {
  if (!yieldStress || !strength) return undefined
  const value = yieldStress.value / strength.value
  return { key: 'yieldRatio', symbol: `${yieldStress.symbol}/Rm`, value, unit: '', quantity: 'ratio', derivation: [
    { text: 'yield ratio, from the unrounded strengths', formula: `${yieldStress.symbol}/Rm = ${plain(yieldStress.value)} / ${plain(strength.value)}`, value, unit: '' },
  ] }
}

/** The uncertainty is in MPa, the unit of the main result. It goes before the last step, which is the reported form. */
function withUncertainty(result: Result, uncertainty: Input['uncertainty']): Result {
  const stated = expanded(uncertainty, undefined, 'MPa')
  if (!stated) return result
  const { expandedUncertainty, coverageFactor, step } = stated
  return { ...result, expandedUncertainty, coverageFactor, derivation: [...result.derivation.slice(0, -1), step, ...result.derivation.slice(-1)] }
}
