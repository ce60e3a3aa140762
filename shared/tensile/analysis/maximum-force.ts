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
const SAME = 1e-7
/** Noise above this share of the maximum decides which of many readings is the highest. */
const NOISY = 6e-4
/** Share of the maximum that the force has to fall behind it. */
const FALL = 0.001

/**
 * Highest stress from point `from` to `last` and the strain that belongs to it: the middle of the plateau where the force stays at its
 * maximum (ISO 6892-1, 3.6.2 and clause 18).
 */
export function maximumForce({ strain, stress }: StressStrain, from: number, last: number, broke: boolean): Maximum {
  let index = from
  for (let i = from + 1; i <= last; i++) if (stress[i]! > stress[index]!) index = i
  const top = stress[index]!
  const noise = noiseOf(stress, Math.max(from, index - NEAR), Math.min(last, index + NEAR))
  const exact = within({ strain, stress }, index, from, last, top * (1 - SAME))
  const close = within({ strain, stress }, index, from, last, top - 3 * noise)
  const wide = within({ strain, stress }, index, from, last, top - 12 * noise)
  const isFlat = noise > 0 && close.count > 20 && wide.to - wide.from < 1.5 * (close.to - close.from)
  const isLevel = exact.count >= 5
  const strainThere = !isLevel && (isFlat || noise > NOISY * top) ? close.mean : (exact.from + exact.to) / 2
  return { index, stress: top, strain: strainThere, isReached: broke || fallsBehind(stress, index, last) }
}

/** Points on either side of the maximum that its noise is taken from. */
const NEAR = 20_000

/** Strains of the readings that reach a stress near the maximum: first, last and mean. Ends where the curve has fallen by a tenth. */
function within({ strain, stress }: StressStrain, index: number, from: number, last: number, floor: number) {
  const end = 0.9 * stress[index]!
  let low = index
  let high = index
  let total = 0
  let count = 0
  const take = (i: number) => {
    total += strain[i]! - strain[index]!
    count++
  }
  for (let i = index; i >= from && stress[i]! > end; i--) {
    if (stress[i]! < floor) continue
    low = i
    take(i)
  }
  for (let i = index + 1; i <= last && stress[i]! > end; i++) {
    if (stress[i]! < floor) continue
    high = i
    take(i)
  }
  return { from: strain[low]!, to: strain[high]!, mean: strain[index]! + (count > 0 ? total / count : 0), count }
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
