import type { FloorStrip } from '../../../shared/api/benches.ts'

/** Strips of one bench that overlap, where it takes several at once, lie under each other: the lane of each, and how many there are. */
export function lanesOf(strips: readonly FloorStrip[]): { lanes: number; laneOf: ReadonlyMap<FloorStrip, number> } {
  const free: string[] = []
  const laneOf = new Map<FloorStrip, number>()
  for (const strip of [...strips].sort((a, b) => a.start.localeCompare(b.start))) {
    const found = free.findIndex((until) => until <= strip.start)
    const lane = found === -1 ? free.length : found
    free[lane] = strip.end
    laneOf.set(strip, lane)
  }
  return { lanes: Math.max(1, free.length), laneOf }
}
