/** An indentation with a known place. `index` is its reading's; lengths in mm. */
export type Placed = { index: number; xMm: number; yMm: number; diameterMm: number }

/** Two indentations nearer than allowed. `index` is the later reading. */
export type TooClose = { index: number; other: number; distanceMm: number; requiredMm: number }

/** A measured length that misses its limit by binary noise only is on the limit. */
export const lengthNoise = 1e-9

/** The readings that have a place; a missing coordinate of the two is 0, as for indentations along a line. */
export function placed<R extends { xMm?: number; yMm?: number }>(readings: readonly R[], diameterMm: (reading: R) => number): Placed[] {
  return readings.flatMap((reading, index) => {
    const { xMm, yMm } = reading
    return xMm === undefined && yMm === undefined ? [] : [{ index, xMm: xMm ?? 0, yMm: yMm ?? 0, diameterMm: diameterMm(reading) }]
  })
}

/**
 * Indentations whose centres lie nearer to an earlier one than `factor` times the diameter of the larger of the two; one finding for
 * each. Points are sorted into squares of the greatest spacing needed, so that each looks at its neighbours only.
 */
export function tooClose(points: readonly Placed[], factor: number): TooClose[] {
  const side = factor * points.reduce((most, one) => Math.max(most, one.diameterMm), 0)
  if (!(side > 0)) return []
  const squares = new Map<string, Placed[]>()
  return points.flatMap((one) => {
    const column = Math.floor(one.xMm / side)
    const row = Math.floor(one.yMm / side)
    const near = [-1, 0, 1].flatMap((c) => [-1, 0, 1].map((r) => squares.get(`${column + c},${row + r}`) ?? []))
    const key = `${column},${row}`
    const square = squares.get(key)
    if (square) square.push(one)
    else squares.set(key, [one])
    for (const others of near) {
      for (const other of others) {
        const requiredMm = factor * Math.max(one.diameterMm, other.diameterMm)
        const distanceMm = Math.hypot(one.xMm - other.xMm, one.yMm - other.yMm)
        if (other !== one && distanceMm < requiredMm * (1 - lengthNoise)) return [{ index: one.index, other: other.index, distanceMm, requiredMm }]
      }
    }
    return []
  })
}
