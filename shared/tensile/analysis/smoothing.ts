import type { StressStrain } from './stress-strain.ts'

/** Triplets looked at for the noise: enough for a median that is good to a few percent. */
const TRIPLETS = 1500

/**
 * Scatter of single readings about a smooth course, in the unit of the values: the median of |second differences| over a sample of
 * the points `from` to `to`, divided by what it is for unit normal noise (0.6745·√6). A smooth curve gives nearly 0, and a few jumps do not count.
 */
export function noiseOf(values: Float64Array, from: number, to: number): number {
  const inner = to - from - 1
  if (inner < 1) return 0
  const step = Math.max(1, Math.floor(inner / TRIPLETS))
  const sizes: number[] = []
  for (let i = from + 1; i < to; i += step) sizes.push(Math.abs(values[i - 1]! - 2 * values[i]! + values[i + 1]!))
  sizes.sort((a, b) => a - b)
  return sizes[Math.floor(sizes.length / 2)]! / 1.652
}

/**
 * The curve with each point from `from` to `to` replaced by the mean of the `2·half + 1` points around it, fewer at the ends of the record
 * so that the mean stays centred; points before `from` are as they were, and the record ends at `to`. Linear in time.
 */
export function smoothed({ strain, stress }: StressStrain, half: number, from: number, to: number): StressStrain {
  const result = { strain: strain.slice(0, to + 1), stress: stress.slice(0, to + 1) }
  const count = stress.length
  // sums of differences from one point, so that they keep their digits
  const origin = { strain: strain[from]!, stress: stress[from]! }
  let low = from
  let high = from - 1
  let strains = 0
  let stresses = 0
  for (let i = from; i <= to; i++) {
    const reach = Math.min(half, i, count - 1 - i)
    while (high < i + reach) {
      high++
      strains += strain[high]! - origin.strain
      stresses += stress[high]! - origin.stress
    }
    while (low > i - reach) {
      low--
      strains += strain[low]! - origin.strain
      stresses += stress[low]! - origin.stress
    }
    while (low < i - reach) {
      strains -= strain[low]! - origin.strain
      stresses -= stress[low]! - origin.stress
      low++
    }
    while (high > i + reach) {
      strains -= strain[high]! - origin.strain
      stresses -= stress[high]! - origin.stress
      high--
    }
    const points = high - low + 1
    result.strain[i] = origin.strain + strains / points
    result.stress[i] = origin.stress + stresses / points
  }
  return result
}

/** Means of `size` points each, of the record up to `last`: a shorter record of the same course, for choosing on. The same for size 1. */
export function blocks({ strain, stress }: StressStrain, size: number, last: number): StressStrain {
  if (size <= 1) return { strain: strain.subarray(0, last + 1), stress: stress.subarray(0, last + 1) }
  const count = Math.floor((last + 1) / size)
  const result = { strain: new Float64Array(count), stress: new Float64Array(count) }
  for (let k = 0; k < count; k++) {
    let strains = 0
    let stresses = 0
    for (let i = k * size; i < (k + 1) * size; i++) {
      strains += strain[i]!
      stresses += stress[i]!
    }
    result.strain[k] = strains / size
    result.stress[k] = stresses / size
  }
  return result
}
