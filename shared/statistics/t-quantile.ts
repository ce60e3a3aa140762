import { gammaRatioHalf } from './gamma-ratio-half.ts'
import { incompleteBetaHalf } from './incomplete-beta-half.ts'
import { normalDensity, normalProbability } from './normal.ts'

/** Above this many degrees of freedom the normal distribution with its first two corrections is exact to a double. */
const NEARLY_NORMAL = 1e6
/** The square of t must stay a number. */
const LARGEST = 1e150

/**
 * Quantile of Student's t: the value that t stays below with `probability` (one-sided, 0 < p < 1), for `degreesOfFreedom` > 0,
 * whole or not; Infinity gives the normal quantile. Newton's method in logarithms, kept inside a bracket, on the tail or on the
 * middle, whichever is the smaller number.
 * @example tQuantile(0.975, 4) // 2.776445…
 */
export function tQuantile(probability: number, degreesOfFreedom: number): number {
  if (!(probability > 0 && probability < 1)) throw new RangeError(`a quantile needs a probability between 0 and 1, not ${probability}`)
  if (!(degreesOfFreedom > 0)) throw new RangeError(`Student's t needs degrees of freedom above 0, not ${degreesOfFreedom}`)
  if (probability === 0.5) return 0
  if (degreesOfFreedom > NEARLY_NORMAL) return nearlyNormal(probability, degreesOfFreedom)
  return solve(probability, (t) => studentParts(t, degreesOfFreedom))
}

type Parts = { tail: number; middle: number; density: number }

/** P(T > t), P(0 < T < t) and the density at t > 0. */
function studentParts(t: number, v: number): Parts {
  const square = t * t
  const x = v / (v + square)
  const y = square / (v + square)
  const { value, complement } = incompleteBetaHalf(v / 2, x, y)
  const density = (gammaRatioHalf(v / 2) / Math.sqrt(v * Math.PI)) * Math.exp((-(v + 1) / 2) * Math.log1p(square / v))
  return { tail: value / 2, middle: complement / 2, density }
}

/** z with the terms in 1/v and 1/v² of the Cornish-Fisher expansion (Abramowitz and Stegun 26.7.5). */
function nearlyNormal(probability: number, v: number): number {
  const z = solve(probability, (t) => ({ tail: normalProbability(-t), middle: normalProbability(t) - 0.5, density: normalDensity(t) }))
  return z + (z ** 3 + z) / (4 * v) + (5 * z ** 5 + 16 * z ** 3 + 3 * z) / (96 * v * v)
}

function solve(probability: number, parts: (t: number) => Parts): number {
  const sign = probability < 0.5 ? -1 : 1
  const tail = probability < 0.5 ? probability : 1 - probability
  const useTail = tail < 0.25
  const target = useTail ? tail : 0.5 - tail
  let low = 0
  let high = Infinity
  let t = 1
  for (let i = 0; i < 400; i++) {
    const now = parts(t)
    const value = useTail ? now.tail : now.middle
    if (value === target) break
    if (useTail === value > target) low = t
    else high = t
    // d ln(value) / d ln(t); negative for the tail
    const slope = ((useTail ? -1 : 1) * now.density * t) / value
    let next = t * Math.exp(Math.log(target / value) / slope)
    if (high === Infinity) next = Math.min(next, t * 16)
    if (!(next > low && next < high)) next = high === Infinity ? t * 4 : low > 0 ? Math.sqrt(low) * Math.sqrt(high) : high / 4
    if (Math.abs(next - t) <= 2e-16 * t) break
    t = next
    if (t > LARGEST) throw new RangeError('the quantile is too large for a number')
  }
  return sign * t
}
