import type { DerivationStep } from '../../method/method.ts'
import { significant } from '../../units/significant.ts'
import type { CurveAnalysis } from '../analysis/analyse-curve.ts'
import { plain } from '../section-area.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import type { TensileReadings } from '../tensile-readings.ts'
import type { Found } from './basis.ts'
import { percentText } from './percent-text.ts'

type Input = { parameters: TensileParameters; readings: TensileReadings; areaMm2: number; analysis: CurveAnalysis | null }

/** Rp0.2, Rp1.0: the offset as it is written in the symbol. */
export function proofSymbol(offsetPercent: number): string {
  return `Rp${Number.isInteger(offsetPercent) ? offsetPercent.toFixed(1) : offsetPercent}`
}

/** Slope of the elastic line mE, MPa. Not a modulus of elasticity: that asks for other measurements (ISO 6892-1, Annex G). */
export function slope({ line }: CurveAnalysis): Found | undefined {
  if (!line) return undefined
  const { points, fromMPa, toMPa, rSquared, slope: value, zeroStrain } = line
  return { key: 'slope', symbol: 'mE', value, unit: 'MPa', quantity: 'slope', derivation: [
    { text: `least squares line through ${points} points from ${significant(fromMPa, 4)} to ${significant(toMPa, 4)} MPa, chosen ${line.chosen}, r² ${rSquared.toFixed(5)}`,
      formula: `R = ${significant(value, 6)} × (e - ${percentText(zeroStrain)} %)`, clause: 'slope of the elastic part, mE', value, unit: 'MPa' },
  ] }
}

/** Rp from the curve, else from the force typed in. */
export function proofStrength({ parameters, readings, areaMm2, analysis }: Input): Found | undefined {
  const { offsetPercent } = parameters
  const symbol = proofSymbol(offsetPercent)
  const basics = { key: 'proofStrength', symbol, unit: 'MPa', quantity: 'stress' } as const
  if (analysis?.line && analysis.proof) {
    const { line, proof } = analysis
    const start = 100 * line.zeroStrain + offsetPercent
    return { ...basics, value: proof.stress, derivation: [
      { text: `offset line, parallel to the elastic line and ${plain(offsetPercent)} % from where that meets zero force`,
        formula: `R = ${significant(line.slope, 6)} × (e - (${percentText(line.zeroStrain)} + ${plain(offsetPercent)}) %)`, value: start, unit: '%' },
      { text: `first crossing with the curve, at e = ${percentText(proof.strain)} %`,
        formula: `${symbol} = F / S0 = ${significant(proof.stress * areaMm2, 6)} / ${plain(areaMm2)}`, clause: `proof strength, plastic extension ${plain(offsetPercent)} %`, value: proof.stress, unit: 'MPa' },
    ] }
  }
  return byHand(basics, readings.proofForceN, areaMm2, 'force at the proof strength, read at the frame')
}

/** ReH from the curve where yielding is discontinuous, else from the force typed in. */
export function upperYield({ readings, areaMm2, analysis }: Input): Found | undefined {
  const basics = { key: 'upperYield', symbol: 'ReH', unit: 'MPa', quantity: 'stress' } as const
  const upper = analysis?.yielding?.upper
  if (!upper) return byHand(basics, readings.upperYieldForceN, areaMm2, 'force at the upper yield point, read at the frame')
  return { ...basics, value: upper.stress, derivation: [
    stressStep('highest stress before the force first drops', 'ReH', upper.stress, areaMm2, upper.strain, 'upper yield strength'),
  ] }
}

/** ReL from the curve where yielding is discontinuous, else from the force typed in. */
export function lowerYield({ readings, areaMm2, analysis }: Input): Found | undefined {
  const basics = { key: 'lowerYield', symbol: 'ReL', unit: 'MPa', quantity: 'stress' } as const
  const lower = analysis?.yielding?.lower
  if (!lower) return byHand(basics, readings.lowerYieldForceN, areaMm2, 'lowest force while yielding, read at the frame')
  return { ...basics, value: lower.stress, derivation: [
    stressStep('lowest stress while yielding, without the first transient', 'ReL', lower.stress, areaMm2, lower.strain, 'lower yield strength'),
  ] }
}

/**
 * Rm. A force typed in counts where there is no curve and where the record stopped before the maximum. Where yielding is discontinuous ISO takes
 * the highest force after the start of hardening, and defines none where nothing hardens; ASTM takes the highest force carried.
 */
export function tensileStrength({ parameters, readings, areaMm2, analysis }: Input): Found | undefined {
  const basics = { key: 'tensileStrength', symbol: 'Rm', unit: 'MPa', quantity: 'stress' } as const
  const typed = byHand(basics, readings.maximumForceN, areaMm2, 'maximum force, read at the frame')
  if (!analysis) return typed
  const { maximum, highest, yielding } = analysis
  const isAstm = parameters.standard === 'ASTM E8/E8M'
  const found = isAstm ? highest : maximum
  if (!found) return undefined
  if (typed && !found.isReached && typed.value > found.stress) return typed
  const text = yielding && !isAstm ? 'highest stress after the start of hardening' : found.isReached ? 'highest stress' : 'highest stress of the record, which ends before a maximum'
  return { ...basics, value: found.stress, derivation: [stressStep(text, 'Rm', found.stress, areaMm2, found.strain, 'tensile strength, Rm = Fm / S0')] }
}

function stressStep(text: string, symbol: string, value: number, areaMm2: number, strain: number, clause: string): DerivationStep {
  return { text: `${text}, at e = ${percentText(strain)} %`, formula: `${symbol} = F / S0 = ${significant(value * areaMm2, 6)} / ${plain(areaMm2)}`, clause, value, unit: 'MPa' }
}

function byHand(basics: Omit<Found, 'value' | 'derivation'>, forceN: number | undefined, areaMm2: number, text: string): Found | undefined {
  if (forceN === undefined) return undefined
  const value = forceN / areaMm2
  return { ...basics, value, derivation: [
    { text, value: forceN, unit: 'N' },
    { text: 'force over original cross-section', formula: `${basics.symbol} = F / S0 = ${plain(forceN)} / ${plain(areaMm2)}`, value, unit: 'MPa' },
  ] }
}
