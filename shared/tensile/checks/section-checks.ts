import type { Check } from '../../method/method.ts'
import { extremes } from '../../statistics/extremes.ts'
import { significant } from '../../units/significant.ts'
import { finalSection } from '../results/reduction-of-area.ts'
import { plain } from '../section-area.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import type { TensileReadings } from '../tensile-readings.ts'

/** Spread of repeated measurements of one size, as a share of the least: machined test pieces stay far below it. */
const SPREAD = 0.02

/** Sizes before and after: typing errors, missing halves, and what cannot be. */
export function sectionChecks({ section }: TensileParameters, readings: TensileReadings, areaMm2: number): Check[] {
  const checks: Check[] = []
  const sizes: Record<string, number[]> = section.shape === 'round' ? { diameters: section.diametersMm } : section.shape === 'rectangular' ? { thicknesses: section.thicknessesMm, widths: section.widthsMm } : {}
  for (const [name, values] of Object.entries(sizes)) {
    const { minimum, maximum } = extremes(values)
    if (maximum > minimum * (1 + SPREAD)) {
      checks.push({ code: 'section-spread', severity: 'warning', message: `the ${name} lie between ${plain(minimum)} and ${plain(maximum)} mm, more than 2 % apart: measure again or say why` })
    }
  }
  const final = finalSection(readings)
  if (final && final.value > areaMm2) {
    checks.push({ code: 'final-section', severity: 'error', message: `the section after fracture, ${significant(final.value, 4)} mm², is larger than before, ${significant(areaMm2, 4)} mm²` })
  }
  if (!final && (readings.finalThicknessMm === undefined) !== (readings.finalWidthMm === undefined)) {
    const missing = readings.finalWidthMm === undefined ? 'width' : 'thickness'
    checks.push({ code: 'final-section', severity: 'warning', message: `the final ${missing} is missing: without it there is no reduction of area` })
  }
  return checks
}
