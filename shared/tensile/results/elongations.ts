import { significant } from '../../units/significant.ts'
import type { CurveAnalysis } from '../analysis/analyse-curve.ts'
import { plain } from '../section-area.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import type { TensileReadings } from '../tensile-readings.ts'
import type { Found } from './basis.ts'
import { percentText } from './percent-text.ts'

type Input = { parameters: TensileParameters; readings: TensileReadings; analysis: CurveAnalysis | null }

/** Ae, %: extension between the upper yield point and the start of uniform hardening (ISO 6892-1, 3.6.3; ASTM's YPE). */
export function yieldPointExtension({ analysis }: Input): Found | undefined {
  const yielding = analysis?.yielding
  if (!yielding || yielding.hardeningStrain === null) return undefined
  const { upper, hardeningStrain } = yielding
  const value = 100 * (hardeningStrain - upper.strain)
  return { key: 'yieldPointExtension', symbol: 'Ae', value, unit: '%', quantity: 'yieldExtension', derivation: [
    { text: 'start of uniform hardening: the plateau level meets the line along the first rise', value: 100 * hardeningStrain, unit: '%' },
    { text: 'extension from the upper yield point to there', formula: `Ae = ${percentText(hardeningStrain)} - ${percentText(upper.strain)}`, clause: 'yield point extension', value, unit: '%' },
  ] }
}

/** Agt and Ag, %: total and plastic extension at maximum force. Missing where no maximum was reached with a living extensometer. */
export function atMaximum({ parameters, analysis }: Input): Found[] {
  const maximum = analysis?.maximum
  const line = analysis?.line
  if (!analysis || !maximum?.isReached || !line || maximum.index > analysis.end.lastExtension) return []
  const total = 100 * (maximum.strain - line.zeroStrain)
  const elastic = (100 * maximum.stress) / line.slope
  const basics = { unit: '%', quantity: 'elongationByExtensometer' } as const
  const totalStep = {
    text: 'extension at maximum force from where the elastic line meets zero force; the middle of the plateau where the force stays at its maximum',
    formula: `Agt = ${percentText(maximum.strain)} - ${percentText(line.zeroStrain)}`, clause: 'total extension at maximum force', value: total, unit: '%',
  }
  const isAstm = parameters.standard === 'ASTM E8/E8M'
  return [
    { ...basics, key: 'extensionAtMaximum', symbol: 'Agt', value: total, derivation: [totalStep] },
    { ...basics, key: 'uniformElongation', symbol: isAstm ? 'Elu' : 'Ag', value: isAstm ? total : total - elastic, derivation: isAstm
      ? [{ ...totalStep, text: 'uniform elongation of ASTM E8/E8M, which includes the elastic part' }]
      : [totalStep, { text: 'without the elastic part at maximum force', formula: `Ag = Agt - 100 × Rm / mE = ${percentText(total / 100)} - 100 × ${significant(maximum.stress, 6)} / ${significant(line.slope, 6)}`,
          clause: 'plastic extension at maximum force', value: total - elastic, unit: '%' }] },
  ]
}

/** A, %: by hand from the marks where a final gauge length was measured; otherwise the plastic extension at fracture from the curve. */
export function elongation({ parameters, readings, analysis }: Input): Found | undefined {
  const original = parameters.originalGaugeLengthMm
  const final = readings.finalGaugeLengthMm
  const basics = { key: 'elongation', symbol: 'A', unit: '%' }
  if (final !== undefined) {
    if (original === undefined || final < original) return undefined
    const value = (100 * (final - original)) / original
    return { ...basics, value, quantity: 'elongationByHand', derivation: [
      { text: 'elongation after fracture, by hand from the marks', formula: `A = 100 × (Lu - L0) / L0 = 100 × (${plain(final)} - ${plain(original)}) / ${plain(original)}`,
        clause: 'percentage elongation after fracture', value, unit: '%' },
    ] }
  }
  if (!analysis?.fracture || !analysis.line) return undefined
  const { fracture, line } = analysis
  const value = 100 * (fracture.strain - line.zeroStrain - fracture.stress / line.slope)
  return { ...basics, value, quantity: 'elongationByExtensometer', derivation: [
    { text: `last point before fracture: ${significant(fracture.stress, 5)} MPa`, value: 100 * fracture.strain, unit: '%' },
    { text: 'plastic extension at fracture, from the extensometer',
      formula: `A = ${percentText(fracture.strain)} - ${percentText(line.zeroStrain)} - 100 × ${significant(fracture.stress, 6)} / ${significant(line.slope, 6)}`,
      clause: 'percentage elongation after fracture by extensometer: the elastic part is taken off', value, unit: '%' },
  ] }
}
