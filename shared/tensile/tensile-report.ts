import type { Result } from '../method/method.ts'
import { editions } from './results/basis.ts'
import { plain } from './section-area.ts'
import { sizeOf } from './plan/misfits.ts'
import type { TensileParameters } from './tensile-parameters.ts'
import type { TensileReadings } from './tensile-readings.ts'

/** How it was tested, for the report: standard, test piece, gauge lengths, and where the extensions come from. */
export function tensileReport({ parameters, readings, results }: { parameters: TensileParameters; readings: TensileReadings; results: Result[] }): string[] {
  const { standard, section, originalGaugeLengthMm, extensometerGaugeLengthMm } = parameters
  const has = (key: string) => results.some((result) => result.key === key)
  const lengths = [
    originalGaugeLengthMm === undefined ? undefined : `L0 = ${plain(originalGaugeLengthMm)} mm`,
    readings.curve && extensometerGaugeLengthMm !== undefined ? `Le = ${plain(extensometerGaugeLengthMm)} mm` : undefined,
  ].filter((part) => part !== undefined)
  const lines = [[editions[standard], `test piece ${sizeOf(section)}`, ...lengths].join(', ')]
  if (readings.curve) {
    const line = results.find((result) => result.key === 'slope')?.derivation[0]?.text
    if (has('proofStrength') && line) lines.push(`Proof strength by offset from the elastic line: ${line}`)
  } else {
    lines.push('Forces read at the frame')
  }
  if (has('elongation')) lines.push(readings.finalGaugeLengthMm !== undefined ? 'Elongation by hand from the marks' : 'Elongation from the extensometer, without the elastic part')
  if (readings.fractureFromNearerMarkMm !== undefined) lines.push(`Fracture ${plain(readings.fractureFromNearerMarkMm)} mm from the nearer mark`)
  return lines
}
