import type { LineFit } from './fit-line.ts'
import type { StressStrain } from './stress-strain.ts'

export type Crossing = { index: number; strain: number; stress: number }

/**
 * First point at which the curve meets the line parallel to the elastic line, shifted by `offset` (a fraction) from that line's own meeting with zero
 * stress (ISO 6892-1, clause 13; ASTM E8/E8M, 7.7.1). It is looked for behind the elastic stretch, so that neither a foot
 * nor noise near the origin counts, and lies on the chord between the two neighbouring points. Null when the record ends first.
 */
export function offsetCrossing({ strain, stress }: StressStrain, line: Pick<LineFit, 'slope' | 'zeroStrain' | 'to'>, offset: number, last: number): Crossing | null {
  const start = line.zeroStrain + offset
  const above = (i: number) => stress[i]! - line.slope * (strain[i]! - start)
  let before = above(line.to)
  for (let i = line.to + 1; i <= last; i++) {
    const here = above(i)
    // one odd reading is no crossing: the next point must lie behind the line too
    if (here <= 0 && (i === last || above(i + 1) <= 0)) {
      const share = before > 0 ? before / (before - here) : 1
      return {
        index: i,
        strain: strain[i - 1]! + share * (strain[i]! - strain[i - 1]!),
        stress: stress[i - 1]! + share * (stress[i]! - stress[i - 1]!),
      }
    }
    before = here
  }
  return null
}
