import { mean } from '../../statistics/mean.ts'
import { significant } from '../../units/significant.ts'
import { measured, plain } from '../section-area.ts'
import type { TensileReadings } from '../tensile-readings.ts'
import type { DerivationStep } from '../../method/method.ts'
import type { Found } from './basis.ts'

type FinalSection = { value: number; derivation: DerivationStep[] }

/** Least cross-section after fracture Su in mm²: π/4 · d² of the mean final diameter, or final thickness × final width. */
export function finalSection({ finalDiametersMm, finalThicknessMm, finalWidthMm }: TensileReadings): FinalSection | undefined {
  if (finalDiametersMm) {
    const diameter = mean(finalDiametersMm)
    const value = (Math.PI / 4) * diameter ** 2
    return { value, derivation: [
      ...measured('final diameters', finalDiametersMm, diameter),
      { text: 'least cross-section after fracture', formula: `Su = π/4 × ${plain(diameter)}²`, value, unit: 'mm2' },
    ] }
  }
  if (finalThicknessMm === undefined || finalWidthMm === undefined) return undefined
  const value = finalThicknessMm * finalWidthMm
  return { value, derivation: [{ text: 'least cross-section after fracture', formula: `Su = ${plain(finalThicknessMm)} × ${plain(finalWidthMm)}`, value, unit: 'mm2' }] }
}

/** Z, %: (S0 - Su) / S0. Missing where the final section was not measured or exceeds the original one. */
export function reductionOfArea(readings: TensileReadings, areaMm2: number): Found | undefined {
  const final = finalSection(readings)
  if (!final || final.value > areaMm2) return undefined
  const value = (100 * (areaMm2 - final.value)) / areaMm2
  return { key: 'reductionOfArea', symbol: 'Z', value, unit: '%', quantity: 'reduction', derivation: [
    ...final.derivation,
    { text: 'reduction of area', formula: `Z = 100 × (S0 - Su) / S0 = 100 × (${significant(areaMm2, 6)} - ${significant(final.value, 6)}) / ${significant(areaMm2, 6)}`,
      clause: 'percentage reduction of area', value, unit: '%' },
  ] }
}
