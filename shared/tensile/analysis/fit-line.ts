import type { StressStrain } from './stress-strain.ts'

/** A straight line through a stretch of the curve: stress = slope · strain + intercept. Strain as a fraction, stress in MPa. */
export type LineFit = {
  /** First and last point of the stretch, both part of it. */
  from: number
  to: number
  points: number
  slope: number
  intercept: number
  /** Strain at which the line meets zero stress. */
  zeroStrain: number
  rSquared: number
  /** Standard deviation of the slope, MPa; 0 for a fit without scatter. */
  slopeDeviation: number
}

/**
 * Least squares of stress on strain over the points `from` to `to`, both included. Two passes, so that a large offset of the
 * extensometer costs no digits. Null where the strain does not vary or the line does not rise.
 */
export function fitLine({ strain, stress }: StressStrain, from: number, to: number): LineFit | null {
  const points = to - from + 1
  if (points < 3) return null
  let meanStrain = 0
  let meanStress = 0
  for (let i = from; i <= to; i++) {
    meanStrain += strain[i]!
    meanStress += stress[i]!
  }
  meanStrain /= points
  meanStress /= points
  let xx = 0
  let xy = 0
  let yy = 0
  for (let i = from; i <= to; i++) {
    const x = strain[i]! - meanStrain
    const y = stress[i]! - meanStress
    xx += x * x
    xy += x * y
    yy += y * y
  }
  if (!(xx > 0) || !(xy > 0)) return null
  const slope = xy / xx
  const intercept = meanStress - slope * meanStrain
  const rSquared = (xy / xx) * (xy / yy)
  const residual = Math.max(0, yy * (1 - rSquared))
  return { from, to, points, slope, intercept, zeroStrain: -intercept / slope, rSquared, slopeDeviation: Math.sqrt(residual / Math.max(1, points - 2) / xx) }
}
