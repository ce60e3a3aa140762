import type { LineFit } from './fit-line.ts'
import type { StressStrain } from './stress-strain.ts'

/** Levels that the stress up to its maximum is cut into. */
const LEVELS = 100
/** Points that are enough for a guess. */
const ENOUGH = 20_000
/** Levels that one trial line spans. */
const SPAN = 8

/**
 * A first guess of the elastic line, to be improved: the steepest stretch of the rising curve. Every point is given to the highest of a hundred stress
 * levels reached so far, each level is averaged, and the steepest line over eight levels wins. Noise, holds and plateaus average out. Linear in time.
 */
export function steepestLine({ strain, stress }: StressStrain, peak: number): Pick<LineFit, 'slope' | 'zeroStrain' | 'to'> | null {
  const top = stress[peak]!
  if (!(top > 0)) return null
  const strains = new Float64Array(LEVELS + 1)
  const stresses = new Float64Array(LEVELS + 1)
  const counts = new Int32Array(LEVELS + 1)
  const lastOf = new Int32Array(LEVELS + 1)
  const perLevel = LEVELS / top
  // of a long record some points do
  const step = Math.max(1, Math.floor(peak / ENOUGH))
  let level = 0
  for (let i = 0; i <= peak; i += step) {
    const here = Math.floor(stress[i]! * perLevel)
    if (here > level) level = here
    strains[level]! += strain[i]!
    stresses[level]! += stress[i]!
    counts[level]! += 1
    lastOf[level] = i
  }
  const filled: { strain: number; stress: number; last: number }[] = []
  for (let k = 0; k <= LEVELS; k++) {
    const count = counts[k]!
    if (count > 0) filled.push({ strain: strains[k]! / count, stress: stresses[k]! / count, last: lastOf[k]! })
  }
  let best: Pick<LineFit, 'slope' | 'zeroStrain' | 'to'> | null = null
  let high = 0
  for (const low of filled) {
    while (high < filled.length && filled[high]!.stress - low.stress < (SPAN / LEVELS) * top) high++
    const upper = filled[high]
    if (!upper) break
    if (!(upper.strain > low.strain)) continue
    const slope = (upper.stress - low.stress) / (upper.strain - low.strain)
    if (!best || slope > best.slope) best = { slope, zeroStrain: low.strain - low.stress / slope, to: upper.last }
  }
  return best
}
