import type { StressStrain } from './stress-strain.ts'

/** Where the useful part of a record ends and what is seen there. */
export type RecordEnd = {
  /** Point of the highest stress. */
  peak: number
  /** Last point before the force collapses, or the last of the record. */
  last: number
  /** Last point at which the extensometer still followed the test piece. */
  lastExtension: number
  /** The force collapsed within the record: the test piece parted. */
  broke: boolean
  /** The record ends with the test piece unloaded on purpose. */
  unloaded: boolean
}

/** Below this share of the maximum the test piece no longer carries (ISO 6892-1 Annex A takes 2 %; grips and zero drift leave more). */
const PARTED = 0.1

/** Finds the end of the useful record: fracture, unloading, and an extensometer that came off or stood still. */
export function recordEnd({ strain, stress }: StressStrain): RecordEnd {
  const count = stress.length
  let peak = 0
  for (let i = 1; i < count; i++) if (stress[i]! > stress[peak]!) peak = i
  const top = stress[peak]!
  let parted = peak + 1
  while (parted < count && stress[parted]! > PARTED * top) parted++
  let last = parted - 1
  let broke = parted < count
  // back over the steep part of the fall: single steps far above the mean step since the maximum
  while (broke && last > peak) {
    const drop = stress[last - 1]! - stress[last]!
    const usual = last - 1 > peak ? (top - stress[last - 1]!) / (last - 1 - peak) : 0
    if (drop <= Math.max(0.02 * top, 5 * usual)) break
    last--
  }
  const unloaded = isUnloading({ strain, stress }, peak, Math.min(parted, count - 1))
  if (unloaded) {
    last = peak
    broke = false
  }
  return { peak, last, lastExtension: extensionEnd({ strain, stress }, last), broke, unloaded }
}

/** A fall to low force along many points in which the strain goes back and never forward is unloading, not fracture. */
function isUnloading({ strain, stress }: StressStrain, peak: number, end: number): boolean {
  if (end - peak < Math.max(8, 0.01 * stress.length) || stress[end]! > 0.5 * stress[peak]!) return false
  const allowed = strain[peak]! + 0.0002
  for (let i = peak + 1; i <= end; i++) if (strain[i]! > allowed) return false
  return strain[end]! < strain[peak]!
}

/** The last point with a living extensometer: before it jumps back, and before it stands still while the force goes on. */
function extensionEnd({ strain, stress }: StressStrain, last: number): number {
  if (last < 4) return last
  // highest strain that is no single spike: the least of two neighbours
  let far = 1
  let farthest = -Infinity
  let least = Infinity
  for (let i = 1; i <= last; i++) {
    const here = Math.min(strain[i]!, strain[i - 1]!)
    if (here > farthest) {
      farthest = here
      far = i
    }
    if (here < least) least = here
  }
  const range = farthest - least
  const atEnd = Math.max(strain[last]!, strain[last - 1]!)
  if (farthest - atEnd > Math.max(0.005, 0.1 * range) && far < last - 2) return far
  const still = 0.001 * range
  let first = last
  let high = -Infinity
  let low = Infinity
  while (first > 0 && Math.abs(strain[first - 1]! - strain[last]!) <= still) {
    first--
    if (stress[first]! > high) high = stress[first]!
    if (stress[first]! < low) low = stress[first]!
  }
  const isStill = last - first >= Math.max(8, 0.02 * last) && high - low > 0.02 * high
  return isStill ? first : last
}
