/**
 * The points of a long curve that a picture `columns` pixels wide needs: in every column of x the first, the lowest, the highest and the
 * last, in the order of the record, so that no peak is lost. A short curve comes back whole. Only x from `from` to `to`, with one
 * neighbour on either side for the line that leaves the picture. Linear in time.
 */
export function thinned(x: ArrayLike<number>, y: ArrayLike<number>, columns: number, range?: { from: number; to: number; lastPoint?: number }): [number, number][] {
  if (!(columns >= 1)) throw new RangeError(`a picture needs at least one column, not ${columns}`)
  const count = Math.min(x.length, y.length, (range?.lastPoint ?? Infinity) + 1)
  const { from, to } = range ?? extent(x, count)
  const perColumn = to > from ? columns / (to - from) : 0
  const columnOf = (i: number) => Math.min(columns, Math.max(-1, Math.floor(((x[i] ?? 0) - from) * perColumn)))
  const points: [number, number][] = []
  const keep = (i: number) => points.push([x[i] ?? 0, y[i] ?? 0])
  let first = 0
  while (first < count) {
    const column = columnOf(first)
    let last = first
    let low = first
    let high = first
    while (last + 1 < count && columnOf(last + 1) === column) {
      last++
      if ((y[last] ?? 0) < (y[low] ?? 0)) low = last
      if ((y[last] ?? 0) > (y[high] ?? 0)) high = last
    }
    const outside = column < 0 || (range !== undefined && (x[first] ?? 0) > to && (x[last] ?? 0) > to)
    // of a stretch outside, only the points next to the picture: a record goes on far beyond its elastic end
    const wanted = outside ? [...(first > 0 ? [first] : []), ...(last < count - 1 ? [last] : [])] : [first, Math.min(low, high), Math.max(low, high), last]
    let before = -1
    for (const i of wanted) {
      if (i > before) keep(i)
      before = Math.max(before, i)
    }
    first = last + 1
  }
  return points
}

function extent(x: ArrayLike<number>, count: number): { from: number; to: number } {
  let from = Infinity
  let to = -Infinity
  for (let i = 0; i < count; i++) {
    const value = x[i] ?? 0
    if (value < from) from = value
    if (value > to) to = value
  }
  return { from, to }
}
