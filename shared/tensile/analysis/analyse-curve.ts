import { elasticLine, type ElasticLine } from './elastic-line.ts'
import { maximumForce, type Maximum } from './maximum-force.ts'
import { offsetCrossing, type Crossing } from './offset-crossing.ts'
import { recordEnd, type RecordEnd } from './record-end.ts'
import { noiseOf, smoothed } from './smoothing.ts'
import { stressStrain, type Curve, type StressStrain } from './stress-strain.ts'
import { yieldPoint, type YieldPoint } from './yield-point.ts'

/** All that a curve says, in full precision: stresses in MPa, strains as fractions of Le. */
export type CurveAnalysis = {
  curve: StressStrain
  end: RecordEnd
  line: ElasticLine | null
  proof: Crossing | null
  yielding: YieldPoint | null
  /** Highest stress of the whole record up to fracture. */
  highest: Maximum
  /** Highest stress after the start of hardening; null when nothing hardens after the upper yield point. */
  maximum: Maximum | null
  /** Last point, where the record reaches fracture with the extensometer still on. */
  fracture: Crossing | null
}

export type CurveInput = { curve: Curve; areaMm2: number; gaugeLengthMm: number; offsetPercent: number; elasticWindow?: { fromMPa: number; toMPa: number } }

/** Without a collapse of the force in the record, a fall to this share of the maximum counts as having gone on to fracture. */
const FALLEN = 0.9

/** Scatter that the averaged curve may have, as a share of the proof strength, and the strain that its average may span. */
const AIM = 0.0005
const SPAN = 0.0005

/** Strain behind the proof strength in which an upper yield point and the levelling off after it are over. */
const YIELDS_WITHIN = 0.02

/** Reads a load-extension record once, in linear time. */
export function analyseCurve({ curve: record, areaMm2, gaugeLengthMm, offsetPercent, elasticWindow }: CurveInput): CurveAnalysis {
  const curve = stressStrain(record, areaMm2, gaugeLengthMm)
  const end = recordEnd(curve)
  const offset = offsetPercent / 100
  const line = elasticLine(curve, end.peak, offset, elasticWindow)
  const highest = maximumForce(curve, 0, end.last, end.broke)
  if (!line) return { curve, end, line, proof: null, yielding: null, highest, maximum: highest, fracture: null }

  const rough = offsetCrossing(curve, line, offset, end.lastExtension)
  const middle = rough?.index ?? end.peak
  const noise = Math.hypot(noiseOf(curve.stress, line.from, middle), line.slope * noiseOf(curve.strain, line.from, middle))
  const half = halfWidth(curve.strain, middle, end.last, noise / (AIM * (rough?.stress ?? highest.stress)))
  const scatter = noiseOf(curve.stress, line.from, Math.min(end.last, 2 * middle)) / Math.sqrt(2 * half + 1)
  const averaged = (to: number) => (half > 0 ? smoothed(curve, half, line.from, to) : curve)
  // a yield point shows soon after the proof strength; only where there is one the rest is averaged too
  const soon = strainReaches(curve.strain, (rough?.strain ?? line.zeroStrain) + YIELDS_WITHIN, middle, end.lastExtension)
  const near = averaged(soon)
  const proof = half > 0 ? (offsetCrossing(near, line, offset, soon) ?? offsetCrossing(averaged(end.lastExtension), line, offset, end.lastExtension)) : rough
  const seen = { raw: curve, half, scatter, line, proof }
  const yielding = yieldPoint({ ...seen, smooth: near, last: soon }) && yieldPoint({ ...seen, smooth: averaged(end.lastExtension), last: end.lastExtension })
  const fracture = fractureOf(curve, end, highest)
  return { curve, end, line, proof, yielding, highest, maximum: yielding ? afterYielding(curve, end, yielding, fracture !== null) : highest, fracture }
}

/** The maximum after the start of hardening. While it lies below the upper yield point it may be a swing of the plateau, unless the record goes on to fracture. */
function afterYielding(curve: StressStrain, { last, broke }: RecordEnd, { upper, hardeningStrain, after }: YieldPoint, toFracture: boolean): Maximum | null {
  if (hardeningStrain === null) return null
  const maximum = maximumForce(curve, after, last, broke)
  return { ...maximum, isReached: maximum.isReached && (toFracture || maximum.stress > upper.stress) }
}

function strainReaches(strain: Float64Array, value: number, from: number, last: number): number {
  let i = from
  while (i < last && strain[i]! < value) i++
  return i
}

function fractureOf({ strain, stress }: StressStrain, { last, lastExtension, broke }: RecordEnd, highest: Maximum): Crossing | null {
  if (lastExtension < last) return null
  if (!broke && !(stress[last]! <= FALLEN * highest.stress && last > highest.index)) return null
  return { index: last, strain: strain[last]!, stress: stress[last]! }
}

/** Points on each side of the mean that bring the noise down as far as asked, within the strain that it may span. */
function halfWidth(strain: Float64Array, index: number, last: number, noiseOverAim: number): number {
  const wanted = Math.ceil((noiseOverAim ** 2 - 1) / 2)
  if (wanted <= 0) return 0
  let half = 0
  while (half < wanted && index - half > 0 && index + half < last && strain[index + half + 1]! - strain[index - half - 1]! < SPAN) half++
  return half
}
