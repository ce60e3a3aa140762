/**
 * The first start at or after `from` for which `[start, start + length)` lies inside one of the open intervals, Infinity if there is none.
 * `open` is in order; all in minutes.
 */
export function firstInside(open: readonly (readonly [number, number])[], from: number, length: number): number {
  let [low, high] = [0, open.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (open[middle]![1] <= from) low = middle + 1
    else high = middle
  }
  for (let i = low; i < open.length; i++) {
    const [opens, closes] = open[i]!
    const start = Math.max(from, opens)
    if (start + length <= closes) return start
  }
  return Infinity
}
