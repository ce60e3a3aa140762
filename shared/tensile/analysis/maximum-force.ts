import { noiseOf } from './smoothing.ts'
import type { StressStrain } from './stress-strain.ts'

export type Maximum = {
  index: number
  stress: number
  /** Strain at the middle of the plateau of highest force. */
  strain: number
  /** Behind it the force falls, or the test piece parted: a maximum, not just the end of the record. */
  isReached: boolean
}

/** Readings this close to the maximum, as a share of it, are the same force but for the rounding of a file. */
const PLATEAU = 1e-7
/** Share of the maximum that the force has to fall behind it. */
const FALL = 0.001

/**
 * Highest stress from point `from` to `last` and the strain that belongs to it: the middle of the plateau where the force stays at its
 * maximum (ISO 6892-1, 3.6.2 and clause 18).
 */
export function maximumForce({ strain, stress }: StressStrain, from: number, last: number, broke: boolean): Maximum {
  let index = from
  let top = stress[from]!
  let first = from
  let end = from
  for (let i = from + 1; i <= last; i++) {
    const here = stress[i]!
    if (here < top * (1 - PLATEAU)) continue
    end = i
    if (here > top * (1 + PLATEAU)) first = i
    if (here > top) {
      top = here
      index = i
    }
  }
  return { index, stress: top, strain: (strain[first]! + strain[end]!) / 2, isReached: broke || fallsBehind(stress, index, last) }
}

/** The mean of the last readings lies below the maximum by more than noise makes the highest of many readings stand out. */
function fallsBehind(stress: Float64Array, index: number, last: number): boolean {
  const count = Math.min(5, last - index)
  if (count === 0) return false
  let mean = 0
  for (let i = last - count + 1; i <= last; i++) mean += stress[i]! / count
  const noise = noiseOf(stress, index - Math.min(index, last - index), last)
  return stress[index]! - mean > Math.max(FALL * stress[index]!, 6 * noise)
}
