import { fitLine, type LineFit } from './fit-line.ts'
import { offsetCrossing } from './offset-crossing.ts'
import { blocks, noiseOf } from './smoothing.ts'
import { steepestLine } from './steepest-line.ts'
import type { StressStrain } from './stress-strain.ts'

/** The elastic line with the stresses, MPa, between which it was fitted, who chose them, and the lines through its lower and upper half. */
export type ElasticLine = LineFit & { fromMPa: number; toMPa: number; chosen: 'by rule' | 'by hand'; lower: LineFit | null; upper: LineFit | null }

/** Points up to the proof strength that are enough to choose a stretch on; a longer record is averaged down for it. */
const ENOUGH = 4000
/** Times that the stretch and the proof strength are found from each other; two or three do. */
const ROUNDS = 8

/** Stretch of the proof strength over which the line is fitted unless the curve says otherwise. */
const USUAL: Stretch = { low: 0.1, high: 0.45 }
type Stretch = { low: number; high: number }

/** The stretch of rising stress between two levels: ends where the upper one is first reached to stay, begins where the lower one was last below. */
export function fitBetween(curve: StressStrain, fromMPa: number, toMPa: number, last: number): LineFit | null {
  const { stress } = curve
  let end = 0
  while (end <= last && !(stress[end]! >= toMPa && (end === last || stress[end + 1]! >= toMPa))) end++
  if (end > last) return null
  let start = end
  while (start > 0 && stress[start - 1]! >= fromMPa) start--
  // the point that oversteps the upper level is not part of the stretch
  return fitLine(curve, start, stress[end]! > toMPa ? end - 1 : end)
}

/**
 * The elastic line. By hand: least squares between the two stresses given. By rule: least squares between 10 % and 45 % of the proof
 * strength, found by repeating from the steepest stretch of the curve; the stretch moves up where a foot or a preload
 * spoils its lower part, and down where yielding has begun within it. Null when fewer than three points make a rising line.
 */
export function elasticLine(curve: StressStrain, peak: number, offset: number, given?: { fromMPa: number; toMPa: number }): ElasticLine | null {
  const stretch = given ?? stretchByRule(curve, peak, offset)
  if (!stretch) return null
  const { fromMPa, toMPa } = stretch
  const single = fitBetween(curve, fromMPa, toMPa, peak)
  if (!single) return null
  const line = { ...withoutFlattening(curve, single), fromMPa, toMPa }
  return { ...line, chosen: given ? 'by hand' : 'by rule', ...halves(curve, line) }
}

/** Share by which noise in the strain may flatten the line, and groups that are enough for one. */
const FLATTENED = 0.002
const GROUPS = 40

/**
 * Noise in the strain flattens a least squares line by the share that its variance has in that of the strain. Where that shows and points
 * abound, the line goes through means of groups of points instead.
 */
function withoutFlattening(curve: StressStrain, line: LineFit): LineFit {
  const { from, to, points } = line
  const size = Math.floor(points / GROUPS)
  const spread = (curve.strain[to]! - curve.strain[from]!) ** 2 / 12
  if (size < 2 || noiseOf(curve.strain, from, to) ** 2 < FLATTENED * spread) return line
  const grouped = blocks({ strain: curve.strain.subarray(from, to + 1), stress: curve.stress.subarray(from, to + 1) }, size, points - 1)
  const fit = fitLine(grouped, 0, grouped.stress.length - 1)
  return fit ? { ...fit, from, to, points } : line
}

function stretchByRule(record: StressStrain, recordPeak: number, offset: number): { fromMPa: number; toMPa: number } | null {
  const first = steepestLine(record, recordPeak)
  if (!first) return null
  const end = offsetCrossing(record, first, offset, recordPeak)?.index ?? recordPeak
  const size = Math.max(1, Math.floor(end / ENOUGH))
  // beyond the crossing by a fifth, since a better line may cross later
  const curve = blocks(record, size, Math.min(recordPeak, Math.ceil(1.2 * end) + 10 * size))
  const peak = curve.stress.length - 1
  const begins = Math.max(0, lowest(curve.stress, Math.min(peak, 4)))
  let line: Pick<LineFit, 'slope' | 'zeroStrain' | 'to'> = { ...first, to: Math.min(peak, Math.floor(first.to / size)) }
  let best: Window | null = null
  for (let round = 0; round < ROUNDS; round++) {
    const proof = offsetCrossing(curve, line, offset, peak)?.stress ?? highest(curve.stress)
    const next = bestStretch(curve, proof, begins, peak)
    if (!next) break
    const isSettled = best !== null && next.from === best.from && next.to === best.to
    best = next
    line = next
    if (isSettled) break
  }
  return best
}

function highest(values: Float64Array): number {
  let most = -Infinity
  for (let i = 0; i < values.length; i++) if (values[i]! > most) most = values[i]!
  return most
}

function halves(curve: StressStrain, { fromMPa, toMPa, to }: Window): { lower: LineFit | null; upper: LineFit | null } {
  const middle = (fromMPa + toMPa) / 2
  return { lower: fitBetween(curve, fromMPa, middle, to), upper: fitBetween(curve, middle, toMPa, Math.min(to + 2, curve.stress.length - 1)) }
}

function lowest(values: Float64Array, to: number): number {
  let least = Infinity
  for (let i = 0; i <= to; i++) if (values[i]! < least) least = values[i]!
  return least
}

type Window = LineFit & { fromMPa: number; toMPa: number }

/** The line over the usual stretch of the proof strength, or over the stretch next to it that is straighter. */
function bestStretch(curve: StressStrain, proof: number, begins: number, peak: number): Window | null {
  const fit = ({ low, high }: Stretch): Window | null => {
    const line = fitBetween(curve, low * proof, high * proof, peak)
    return line && { ...line, fromMPa: low * proof, toMPa: high * proof }
  }
  let stretch = USUAL
  // first points missing: the record begins inside the usual stretch
  const start = begins / proof
  if (start > stretch.low) stretch = { low: Math.min(0.6, start + 0.02), high: Math.min(0.8, Math.max(stretch.high, start + 0.27)) }
  let line = fit(stretch)
  for (const wider of [{ low: 0.05, high: 0.6 }, { low: 0, high: 0.8 }]) {
    if (line && line.points >= 5) break
    line = fit(wider) ?? line
    stretch = wider
  }
  if (!line || line.points < 12) return line

  let moved: Stretch = stretch
  let upper: Window | null = line
  while (upper && moved.low < 0.4 && hasFoot(curve, upper)) {
    const low = moved.low + 0.05
    moved = { low, high: Math.min(0.7, Math.max(moved.high, low + 0.25)) }
    upper = fit(moved)
  }
  if (upper && upper !== line && upper.points >= 5) return upper

  for (const lower of [{ low: 0.05, high: 0.3 }, { low: 0.03, high: 0.2 }]) {
    if (lower.low < start || !yieldsWithin(curve, line, proof, peak)) break
    const below = fit(lower)
    if (!below || below.points < 12) break
    line = below
  }
  return line
}

/** Share by which the lower half may be less steep than the upper one before it counts as a foot. */
const FOOT = 0.04

function hasFoot(curve: StressStrain, line: Window): boolean {
  const { lower, upper } = halves(curve, line)
  if (!lower || !upper) return false
  return upper.slope - lower.slope > Math.max(FOOT * upper.slope, 3 * Math.hypot(lower.slopeDeviation, upper.slopeDeviation))
}

/** Yielding has begun within the stretch: its thirds flatten one after the other by a tenth in all, and it goes on above. */
function yieldsWithin(curve: StressStrain, line: Window, proof: number, peak: number): boolean {
  const step = (line.toMPa - line.fromMPa) / 3
  const thirds = [0, 1, 2, 3].map((k) => fitBetween(curve, line.fromMPa + k * step, k === 3 ? line.toMPa + 0.15 * proof : line.fromMPa + (k + 1) * step, peak))
  const [a, b, c, above] = thirds
  if (!a || !b || !c || !above) return false
  const scatter = 3 * Math.hypot(a.slopeDeviation, c.slopeDeviation)
  return a.slope > b.slope && b.slope > c.slope && c.slope > above.slope && a.slope - c.slope > Math.max(0.1 * a.slope, scatter)
}
