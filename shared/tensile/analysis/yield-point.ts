import type { Crossing } from './offset-crossing.ts'
import type { StressStrain } from './stress-strain.ts'
import { fitLine, type LineFit } from './fit-line.ts'
import { smoothed } from './smoothing.ts'

/** Discontinuous yielding. Stresses in MPa, strains as fractions. */
export type YieldPoint = {
  upper: Crossing
  /** Lowest stress while yielding, without the first transient. */
  lower: Crossing
  /** Strain at which uniform hardening begins; null when nothing hardens after the upper yield point. */
  hardeningStrain: number | null
  /** First point from which the later maximum is looked for. */
  after: number
}

/** The force must drop by this share and stay below for this strain (ISO 6892-1 Annex A, upper yield strength). */
const DROP = 0.005
const STAYS_BELOW = 0.0005
/** An upper yield point lies at the end of the elastic line: later maxima with more plastic strain are no yield points. */
const MOST_PLASTIC = 0.01

type Input = {
  raw: StressStrain
  /** The same curve with its noise averaged down. */
  smooth: StressStrain
  /** Points on each side that went into the average. */
  half: number
  /** Scatter of the averaged stress, MPa. */
  scatter: number
  line: LineFit
  proof: Crossing | null
  last: number
}

/** Finds an upper yield point with what follows, or null where yielding is continuous. */
export function yieldPoint(input: Input): YieldPoint | null {
  const top = upperYield(input)
  if (!top) return null
  const { smooth, last } = input
  return { upper: upperPoint(input, top.peak), ...yielding({ ...input, last, peak: top.peak, dropped: top.dropped }, smooth) }
}

/** The peak itself: averaged over no more strain than leaves its tip standing, so over nothing in a record of ordinary density. */
const TIP = 5e-6

function upperPoint({ raw, half, last }: Input, peak: number): Crossing {
  const low = Math.max(0, peak - half)
  const high = Math.min(last, peak + half)
  let reach = 0
  while (reach < half && peak - reach > 0 && peak + reach < last && raw.strain[peak + reach + 1]! - raw.strain[peak - reach - 1]! < 2 * TIP) reach++
  const near = reach > 0 ? smoothed(raw, reach, low, high) : raw
  let upper = peak
  for (let i = low; i <= high; i++) if (near.stress[i]! > near.stress[upper]!) upper = i
  return point(near, upper)
}

function point({ strain, stress }: StressStrain, index: number): Crossing {
  return { index, strain: strain[index]!, stress: stress[index]! }
}

function upperYield({ smooth: { strain, stress }, scatter, line, proof, last }: Input): { peak: number; dropped: number } | null {
  const enough = 0.95 * (proof?.stress ?? Infinity)
  let start = line.to
  while (start <= last && stress[start]! < enough) start++
  if (start > last) return null
  let peak = start
  let dropped = -1
  for (let i = start; i <= last; i++) {
    if (stress[i]! > stress[peak]!) {
      peak = i
      dropped = -1
      if (strain[i]! - line.zeroStrain - stress[i]! / line.slope > MOST_PLASTIC) return null
      continue
    }
    if (dropped < 0 && stress[i]! <= stress[peak]! - Math.max(DROP * stress[peak]!, 6 * scatter)) dropped = i
    if (dropped >= 0 && strain[i]! - strain[peak]! >= STAYS_BELOW) return levelsOff({ strain, stress }, peak, last) ? { peak, dropped } : null
  }
  return null
}

/**
 * After a yield point the stress falls and then levels off; after the maximum force of a necking test piece it falls faster and
 * faster. So the fall over the first 0.25 % of strain is held against the fall over the 0.5 % that follow.
 */
function levelsOff({ strain, stress }: StressStrain, peak: number, last: number): boolean {
  const origin = strain[peak]!
  let i = peak
  let least = stress[peak]!
  while (i <= last && strain[i]! - origin <= 0.0025) least = Math.min(least, stress[i++]!)
  if (i > last) return strain[last]! - origin > 0.001 && stress[last]! - least > 0.2 * (stress[peak]! - least)
  let end = i
  while (end < last && strain[end]! - origin < 0.0075) end++
  const share = Math.min(1, (strain[end]! - origin - 0.0025) / 0.005)
  return stress[i - 1]! - stress[end]! < Math.max(0.2, share) * (stress[peak]! - least)
}

/** Plateau level, lower yield strength and start of hardening behind the upper yield point. */
function yielding({ last, scatter, peak, dropped }: Input & { peak: number; dropped: number }, { strain, stress }: StressStrain): Omit<YieldPoint, 'upper'> {
  const later = endOfRise(stress, dropped, last)
  let least = peak
  for (let i = peak; i <= later; i++) if (stress[i]! < stress[least]!) least = i
  const floor = stress[least]!
  const rise = stress[later]! - floor
  if (rise < Math.max(DROP * floor, 6 * scatter)) {
    const end = strainIndex(strain, peak, strain[peak]! + 0.0025, last)
    return { lower: lowest({ strain, stress }, peak, end, levelOf(stress, dropped, end), scatter), hardeningStrain: null, after: dropped }
  }
  let leaves = lastAtMost(stress, floor + 0.1 * rise, later, peak)
  const near = strainIndex(strain, peak, strain[peak]! + 0.2 * (strain[leaves]! - strain[peak]!), leaves)
  const far = strainIndex(strain, peak, strain[peak]! + 0.8 * (strain[leaves]! - strain[peak]!), leaves)
  const level = levelOf(stress, near, far)
  let swing = 0
  for (let i = near; i <= far; i++) swing = Math.max(swing, Math.abs(stress[i]! - level))
  const gain = stress[later]! - level
  const from = lastAtMost(stress, level + Math.max(0.03 * gain, Math.min(1.5 * swing, 0.3 * gain)), later, peak)
  let to = Math.min(from + 1, later)
  while (to < later && stress[to]! < level + Math.max(0.15 * gain, Math.min(1.5 * swing, 0.3 * gain) + 0.12 * gain)) to++
  const hardens = fitLine({ strain, stress }, Math.max(peak, Math.min(from, to - 2)), to)
  const begins = hardens ? (level - hardens.intercept) / hardens.slope : strain[leaves]!
  const hardeningStrain = Math.min(Math.max(begins, strain[peak]!), strain[to]!)
  leaves = Math.max(dropped, Math.min(leaves, from))
  return { lower: lowest({ strain, stress }, peak, leaves, level, scatter), hardeningStrain, after: leaves }
}

/** End of the greatest rise in a stretch: where the stress stands highest above an earlier low. */
function endOfRise(stress: Float64Array, from: number, last: number): number {
  let low = from
  let end = from
  let greatest = 0
  for (let i = from; i <= last; i++) {
    if (stress[i]! < stress[low]!) low = i
    if (stress[i]! - stress[low]! > greatest) {
      greatest = stress[i]! - stress[low]!
      end = i
    }
  }
  return end
}

function strainIndex(strain: Float64Array, from: number, value: number, last: number): number {
  let i = from
  while (i < last && strain[i]! < value) i++
  return i
}

function lastAtMost(stress: Float64Array, value: number, from: number, down: number): number {
  let i = from
  while (i > down && stress[i]! > value) i--
  return i
}

/** Median of up to a thousand stresses of a stretch. */
function levelOf(stress: Float64Array, from: number, to: number): number {
  const step = Math.max(1, Math.floor((to - from + 1) / 1000))
  const sample: number[] = []
  for (let i = from; i <= to; i += step) sample.push(stress[i]!)
  sample.sort((a, b) => a - b)
  return sample[Math.floor(sample.length / 2)]!
}

/**
 * Lowest stress from the upper yield point to the start of hardening. The first undershoot below the plateau's level is the transient
 * that ISO 6892-1 (3.10.2.2) leaves out: the search begins when the stress has come back to the level, unless that takes more than half of the stretch.
 */
function lowest(curve: StressStrain, peak: number, end: number, level: number, scatter: number): Crossing {
  const { strain, stress } = curve
  const band = Math.max(1e-4 * level, 6 * scatter)
  let under = peak
  while (under < end && stress[under]! >= level - band) under++
  let back = under
  // noise must not end the undershoot as soon as it begins
  while (back < end && stress[back]! < level - 0.25 * band) back++
  let start = back
  if (under >= end) {
    // no undershoot: from where the stress has come down to the plateau
    start = peak
    while (start < end && stress[start]! > level + band) start++
  } else if (strain[back]! > (strain[peak]! + strain[end]!) / 2) start = under
  let least = start
  for (let i = start; i <= end; i++) if (stress[i]! < stress[least]!) least = i
  return point(curve, least)
}
