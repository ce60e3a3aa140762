import { difference } from '../units/difference.ts'
import { settled } from '../units/settled.ts'
import { normalProbability } from './normal.ts'

export type Judged = { outcome: 'pass' | 'fail' | 'undecided'; guardBand: number; probabilityOfConformity?: number }

/**
 * Holds a value against its limits. 'simple' takes the value as it is, limits included (ILAC-G8:09/2019, simple acceptance). 'guarded' keeps a
 * guard band w = U inside and outside: pass inside every limit by w or more, fail outside one by more than w, else undecided;
 * without U nothing can be guarded and it is undecided. The value is compared unrounded (ASTM E29, absolute method) and
 * the probability is that of a normal distribution with u = U/k. All in one unit.
 * @example conformity({ value: 361, expandedUncertainty: 6, coverageFactor: 2, lower: 355, rule: 'guarded' }).outcome // 'pass'
 */
export function conformity({ value, expandedUncertainty, coverageFactor = 2, lower = -Infinity, upper = Infinity, rule }: {
  value: number
  expandedUncertainty?: number
  coverageFactor?: number
  lower?: number
  upper?: number
  rule: 'simple' | 'guarded'
}): Judged {
  if (lower > upper) throw new RangeError(`the lower limit ${lower} lies above the upper limit ${upper}`)
  // how far inside the nearer limit; negative when outside
  const inside = Math.min(distance(value, lower), distance(upper, value))
  const guardBand = rule === 'guarded' ? expandedUncertainty ?? 0 : 0
  const probabilityOfConformity = expandedUncertainty === undefined ? undefined
    : probabilityWithin(value, expandedUncertainty / coverageFactor, lower, upper)
  if (rule === 'simple') return { outcome: inside >= 0 ? 'pass' : 'fail', guardBand, probabilityOfConformity }
  if (expandedUncertainty === undefined) return { outcome: 'undecided', guardBand }
  const band = settled(guardBand)
  return { outcome: inside >= band ? 'pass' : inside < -band ? 'fail' : 'undecided', guardBand, probabilityOfConformity }
}

function distance(from: number, to: number): number {
  return Number.isFinite(from) && Number.isFinite(to) ? difference(from, to) : Infinity
}

/** From the nearer side, so that a probability near 1 is one minus a small number and not a difference of two ones. */
function probabilityWithin(value: number, u: number, lower: number, upper: number): number {
  if (u === 0) return value >= lower && value <= upper ? 1 : 0
  const below = normalProbability((lower - value) / u)
  const above = normalProbability((value - upper) / u)
  return value < lower ? normalProbability((value - lower) / u) - above : value > upper ? normalProbability((upper - value) / u) - below : 1 - below - above
}
