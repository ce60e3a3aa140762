import type { Check } from '../../method/method.ts'
import { round } from '../../units/round.ts'
import { significant } from '../../units/significant.ts'
import { diameterFormula, indentationDiameter, rockwellDepth } from './rockwell-depth.ts'
import type { RockwellParameters, RockwellReading } from './rockwell-input.ts'
import { depthsOfThickness, greatestCorrection, rockwellRules, rockwellSpacing } from './rockwell-rules.ts'
import { rockwellScale } from './rockwell-scale.ts'
import { lengthNoise, placed, tooClose } from '../spacing.ts'

/** The rules of the method that a set breaks; `corrected` are the hardness values that the readings stand for. */
export function rockwellChecks(parameters: RockwellParameters, readings: readonly RockwellReading[], corrected: readonly number[]): Check[] {
  return [
    ...count(readings), ...range(parameters, corrected), ...spacing(parameters, readings), ...edges(parameters, readings),
    ...thickness(parameters, readings), ...correction(parameters, readings, corrected),
  ]
}

/** Neither standard fixes a number for a product test, so fewer than three is a matter for a remark and not a broken rule. */
function count(readings: readonly RockwellReading[]): Check[] {
  if (readings.length >= 3) return []
  return [{ code: 'too-few-readings', severity: 'warning', message: `${readings.length} of the usual 3 readings: neither standard fixes a number, the product standard may` }]
}

/** ISO 6508-1 states where each scale applies; under E18 the same bounds are usual practice. */
function range({ standard, scale }: RockwellParameters, corrected: readonly number[]): Check[] {
  const { from, to } = rockwellScale[scale]
  return corrected.flatMap((value, reading): Check[] => value >= from && value <= to ? [] : [{
    code: 'outside-scale', severity: standard === 'ISO 6508-1' ? 'error' : 'warning', reading,
    message: `reading ${reading + 1}, ${round(value, '0.1')} ${scale}, lies outside the scale's range of ${from} to ${to}`,
  }])
}

function diameterOf({ scale }: RockwellParameters, reading: RockwellReading): number {
  return indentationDiameter(scale, rockwellDepth(scale, reading.value))
}

function spacing(parameters: RockwellParameters, readings: readonly RockwellReading[]): Check[] {
  return tooClose(placed(readings, (reading) => diameterOf(parameters, reading)), rockwellSpacing.centres).map(({ index, other, distanceMm, requiredMm }) => ({
    code: 'spacing', severity: 'error', reading: index,
    message: `reading ${index + 1} lies ${mm(distanceMm)} from reading ${other + 1}: ${rockwellSpacing.centres} diameters, ${mm(requiredMm)}, `
      + `are needed between centres (${diameterFormula(parameters.scale)})`,
  }))
}

function edges(parameters: RockwellParameters, readings: readonly RockwellReading[]): Check[] {
  return readings.flatMap((one, reading): Check[] => {
    const required = rockwellSpacing.edge * diameterOf(parameters, one)
    if (one.edgeMm === undefined || one.edgeMm >= required * (1 - lengthNoise)) return []
    return [{
      code: 'edge-distance', severity: 'error', reading,
      message: `reading ${reading + 1} lies ${mm(one.edgeMm)} from the edge: ${rockwellSpacing.edge} diameters, ${mm(required)}, are needed (${diameterFormula(parameters.scale)})`,
    }]
  })
}

/** By the deepest print; the depth is that of the reading as shown. */
function thickness({ standard, scale, thicknessMm }: RockwellParameters, readings: readonly RockwellReading[]): Check[] {
  if (thicknessMm === undefined) return []
  const depths = depthsOfThickness(standard, scale)
  const reading = readings.reduce((least, one, i) => (one.value < (readings[least]?.value ?? Infinity) ? i : least), 0)
  const required = depths * rockwellDepth(scale, readings[reading]?.value ?? 0)
  if (thicknessMm >= required * (1 - lengthNoise)) return []
  return [{
    code: 'thickness', severity: 'error', reading,
    message: `the piece is ${mm(thicknessMm)} thick: ${depths} times the depth of reading ${reading + 1}, ${mm(required)}, are needed (${rockwellRules[standard].edition})`,
  }]
}

function correction({ standard, scale, surface }: RockwellParameters, readings: readonly RockwellReading[], corrected: readonly number[]): Check[] {
  if (surface.shape === 'flat' || standard === 'ASTM E18') return []
  const greatest = greatestCorrection(scale)
  const reading = readings.findIndex((one, i) => (corrected[i] ?? 0) - one.value > greatest + lengthNoise)
  if (reading < 0) return []
  return [{
    code: 'cylinder-correction', severity: 'warning', reading,
    message: `reading ${reading + 1} needs a correction of more than ${greatest} HR for its curved surface, for which ISO 6508-1 gives no figure: prefer a flat`,
  }]
}

function mm(length: number): string {
  return `${significant(length, 3)} mm`
}
