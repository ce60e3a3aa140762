import type { Check } from '../../method/method.ts'
import { significant } from '../../units/significant.ts'
import { plain } from '../section-area.ts'
import type { TensileParameters } from '../tensile-parameters.ts'
import type { TensileReadings } from '../tensile-readings.ts'

/** Proportional test piece: L0 = 5.65 √S0, within what rounding to 5 mm may change (ISO 6892-1, Annexes B to E). */
const PROPORTIONAL = 5.65
const MAY_DIFFER = 0.1

/** Gauge lengths, marks and the place of the fracture. `fromCurve` says that the elongation was taken from the extensometer. */
export function gaugeLengthChecks(parameters: TensileParameters, readings: TensileReadings, areaMm2: number, fromCurve: boolean): Check[] {
  const checks: Check[] = []
  const warn = (code: string, message: string) => checks.push({ code, severity: 'warning', message })
  const { originalGaugeLengthMm: original, extensometerGaugeLengthMm: extensometer } = parameters
  const { finalGaugeLengthMm: final, fractureFromNearerMarkMm: distance, curve } = readings
  if (curve && original === undefined && extensometer === undefined) {
    warn('gauge-length-missing', 'the extensometer gauge length is missing: without it the record gives no strain, so neither proof strength nor extensions')
  }
  if (final !== undefined && original === undefined) warn('gauge-length-missing', 'the original gauge length is missing: without it the final gauge length gives no elongation')
  if (final !== undefined && original !== undefined && final < original) {
    checks.push({ code: 'final-gauge-length', severity: 'error', message: `the final gauge length, ${plain(final)} mm, is shorter than the original one, ${plain(original)} mm` })
  }
  if (distance !== undefined && final !== undefined && distance > final / 2) {
    checks.push({ code: 'fracture-position', severity: 'error', message: `the fracture cannot be ${plain(distance)} mm from the nearer mark: half of the final gauge length is ${plain(final / 2)} mm` })
  } else if (distance !== undefined && original !== undefined) {
    const isAstm = parameters.standard === 'ASTM E8/E8M'
    const least = original / (isAstm ? 4 : 3)
    // 16.666666666666668 mm is a third of 50 mm
    if (distance < least * (1 - 1e-9)) {
      warn('fracture-outside', isAstm
        ? `fractured ${plain(distance)} mm from the nearer mark, outside the middle half of the gauge length (${significant(least, 4)} mm or more): the elongation may not represent the material`
        : `fractured ${plain(distance)} mm from the nearer mark, outside the middle third of the gauge length (${significant(least, 4)} mm or more): the elongation counts only if it meets the least value all the same`)
    }
  }
  if (fromCurve && original !== undefined && extensometer !== undefined && Math.abs(extensometer / original - 1) > 0.01) {
    warn('gauge-length-differs', `the elongation comes from an extensometer of ${plain(extensometer)} mm, not from the original gauge length of ${plain(original)} mm`)
  }
  if (parameters.standard === 'ISO 6892-1' && original !== undefined) {
    const ratio = original / Math.sqrt(areaMm2)
    if (Math.abs(ratio / PROPORTIONAL - 1) > MAY_DIFFER) {
      checks.push({ code: 'gauge-length-not-proportional', severity: 'info', message: `the original gauge length is ${significant(ratio, 3)} √S0, not 5.65 √S0: state it with the elongation, as A${plain(original)}mm` })
    }
  }
  return checks
}
