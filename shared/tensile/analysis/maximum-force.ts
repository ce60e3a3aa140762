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

/** Readings this close to the maximum, as a share of it, stand on its plateau: below the resolution of any force measurement. */
const PLATEAU = 1e-5
/** Share of the maximum that the force has to fall behind it. */
const FALL = 0.001

/**
 * Highest stress from point `from` to `last` and the strain that belongs to it: the middle of the plateau where the force stays at its
 * maximum (ISO 6892-1, 3.6.2 and clause 18).
 */
export function maximumForce({ strain, stress }: StressStrain, from: number, last: number, broke: boolean): Maximum {
  let index = from
  for (let i = from; i <= last; i++) if (stress[i]! > stress[index]!) index = i
  const top = stress[index]!
  let first = index
  let end = index
  for (let i = index; i >= from; i--) if (stress[i]! >= top * (1 - PLATEAU)) first = i
  for (let i = index; i <= last; i++) if (stress[i]! >= top * (1 - PLATEAU)) end = i
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
