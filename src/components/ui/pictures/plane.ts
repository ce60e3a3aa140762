import { scaleLinear, type ScaleLinear } from 'd3-scale'

export type Margins = { top: number; right: number; bottom: number; left: number }
/** The drawing plane of a picture: its size, margins and the two scales from numbers to places. */
export type Plane = { width: number; height: number; margins: Margins; x: ScaleLinear<number, number>; y: ScaleLinear<number, number> }

/** `plane({ width: 800, height: 400, x: [0, 0.01], y: [0, 1100] })`; `round` widens both ranges to whole ticks. */
export function plane({ width, height, margins = { top: 20, right: 18, bottom: 46, left: 64 }, x, y, round = false }: { width: number; height: number; margins?: Margins; x: readonly [number, number]; y: readonly [number, number]; round?: boolean }): Plane {
  const xScale = scaleLinear(spread(x), [margins.left, width - margins.right])
  const yScale = scaleLinear(spread(y), [height - margins.bottom, margins.top])
  return { width, height, margins, x: round ? xScale.nice() : xScale, y: round ? yScale.nice() : yScale }
}

/** A range of no width cannot be drawn: one point stands in the middle of its own size. */
function spread([from, to]: readonly [number, number]): [number, number] {
  if (to > from) return [from, to]
  const half = Math.abs(from) * 0.1 || 1
  return [from - half, from + half]
}

/** Least and greatest of the numbers; 0 to 1 when there are none. */
export function extent(numbers: Iterable<number>): [number, number] {
  let low = Infinity
  let high = -Infinity
  for (const number of numbers) {
    if (number < low) low = number
    if (number > high) high = number
  }
  return low <= high ? [low, high] : [0, 1]
}

/** The path of a line through points, in places. Long records keep the least and greatest of every half pixel, so no peak is lost. */
export function linePath(points: readonly (readonly [number, number])[], { x, y, width }: Plane): string {
  return thinned(points.map(([a, b]) => [x(a), y(b)]), width).map(([a, b], place) => `${place ? 'L' : 'M'}${a.toFixed(1)} ${b.toFixed(1)}`).join('')
}

type Place = readonly [number, number]

function thinned(places: readonly Place[], width: number): readonly Place[] {
  if (places.length < width * 4) return places
  const kept: Place[] = []
  let start = 0
  while (start < places.length) {
    const cell = Math.floor((places[start]?.[0] ?? 0) * 2)
    let end = start
    let low = start
    let high = start
    while (end < places.length && Math.floor((places[end]?.[0] ?? 0) * 2) === cell) {
      if ((places[end]?.[1] ?? 0) < (places[low]?.[1] ?? 0)) low = end
      if ((places[end]?.[1] ?? 0) > (places[high]?.[1] ?? 0)) high = end
      end += 1
    }
    for (const place of [...new Set([start, low, high, end - 1])].sort((a, b) => a - b)) kept.push(places[place] ?? [0, 0])
    start = end
  }
  return kept
}
