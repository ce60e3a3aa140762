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

/** Moving mean over `2·half + 1` points, shorter at the ends so that it stays centred; the values themselves for `half` 0. Linear in time. */
export function smoothed(values: Float64Array, half: number): Float64Array {
  if (half <= 0) return values
  const count = values.length
  const result = new Float64Array(count)
  const base = values[0] ?? 0
  let low = 0
  let high = -1
  let total = 0
  for (let i = 0; i < count; i++) {
    const reach = Math.min(half, i, count - 1 - i)
    while (high < i + reach) total += values[++high]! - base
    while (low < i - reach) total -= values[low++]! - base
    while (high > i + reach) total -= values[high--]! - base
    result[i] = base + total / (2 * reach + 1)
  }
  return result
}
