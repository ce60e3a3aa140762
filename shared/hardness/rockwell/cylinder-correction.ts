import type { CorrectionTable } from './correction-table.ts'
import type { RockwellScale } from './rockwell-scale.ts'
import { cylinderBall } from '../tables/cylinder-ball.ts'
import { cylinderCone } from '../tables/cylinder-cone.ts'

/** The scales that ASTM E18 prints a table for which this program holds. */
const tableFor: Partial<Record<RockwellScale, CorrectionTable>> = {
  HRC: cylinderCone, HRA: cylinderCone, HRD: cylinderCone,
  HRBW: cylinderBall, HRFW: cylinderBall, HRGW: cylinderBall,
}

/** The diameters in mm that can be corrected on this scale; undefined when it has no table. */
export function correctableDiameters(scale: RockwellScale): { from: number; to: number } | undefined {
  const diameters = tableFor[scale]?.diametersMm
  const from = diameters?.[0]
  const to = diameters?.at(-1)
  return from === undefined || to === undefined ? undefined : { from, to }
}

/**
 * What to add to a reading taken on a convex cylinder (ASTM E18-22, tables of corrections), in HR units, linear between the rows and columns of
 * the table; diameters in mm as headed. Throws RangeError for a scale without a table and outside the table.
 * @example cylinderCorrection('HRC', 30, 10) // 3.5
 */
export function cylinderCorrection(scale: RockwellScale, reading: number, diameterMm: number): number {
  const table = tableFor[scale]
  if (!table) throw new RangeError(`there is no table of cylinder corrections for ${scale}`)
  const column = between(table.diametersMm, diameterMm, `a cylinder of ${diameterMm} mm`, 'mm')
  const row = between(table.rows.map((one) => one.reading), reading, `a reading of ${reading} ${scale} on a cylinder`, scale)
  const cell = (r: number, c: number) => table.rows[r]?.corrections[c] ?? 0
  const along = (r: number) => cell(r, column.index) * (1 - column.share) + cell(r, column.index + 1) * column.share
  return along(row.index) * (1 - row.share) + along(row.index + 1) * row.share
}

/** The interval of rising `marks` that holds `value`, and how far into it the value lies. */
function between(marks: readonly number[], value: number, what: string, unit: string): { index: number; share: number } {
  const first = marks[0] ?? NaN
  const last = marks.at(-1) ?? NaN
  if (!(value >= first && value <= last)) throw new RangeError(`${what} lies outside the table of corrections, ${first} to ${last} ${unit}`)
  const next = marks.findIndex((mark, i) => i > 0 && value <= mark)
  const low = marks[next - 1] ?? NaN
  const high = marks[next] ?? NaN
  return { index: next - 1, share: (value - low) / (high - low) }
}
