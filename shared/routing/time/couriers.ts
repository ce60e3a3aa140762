import type { Site } from '../shop.ts'

export type Leg = { from: number; to: number; depart: number; arrive: number }
type Line = { from: number; to: number; departures: number[]; minutes: number }

/** The couriers between sites (by index), ways over further sites included. Nothing leaves before `now`. */
export class Couriers {
  private readonly lines: Line[] = []
  private readonly count: number
  /** Arrivals already worked out, by site and time of departure. */
  private readonly known: Map<number, number[]>[]

  constructor(sites: Site[], now: number) {
    this.count = sites.length
    this.known = sites.map(() => new Map<number, number[]>())
    const index = new Map(sites.map((site, i) => [site.id, i]))
    sites.forEach((site, from) => {
      for (const { to, departures, minutes } of site.courier) {
        const target = index.get(to)
        if (target === undefined || target === from) continue
        const later = departures.filter((depart) => depart >= now).sort((a, b) => a - b)
        if (later.length) this.lines.push({ from, to: target, departures: later, minutes })
      }
    })
  }

  /** The earliest time at which what is ready at `from` at `time` can be at `to`; Infinity if no courier goes there. */
  arrival(from: number, to: number, time: number): number {
    if (from === to) return time
    if (!this.lines.length || time === Infinity) return Infinity
    const known = this.known[from]!
    let times = known.get(time)
    if (!times) {
      times = this.rounds(from, time).at(-1)!
      known.set(time, times)
    }
    return times[to]!
  }

  /** The way with the fewest legs that is there by `by`, the earliest among those; null if there is none. */
  way(from: number, to: number, time: number, by: number): Leg[] | null {
    if (from === to) return []
    const rounds = this.rounds(from, time)
    let round = rounds.findIndex((times) => times[to]! <= by)
    if (round < 0) return null
    const legs: Leg[] = []
    for (let at = to; round > 0; round--) {
      const before = rounds[round - 1]!
      if (before[at] === rounds[round]![at]) continue
      for (const line of this.lines) {
        const depart = line.to === at ? nextDeparture(line.departures, before[line.from]!) : Infinity
        if (depart + line.minutes !== rounds[round]![at]) continue
        legs.unshift({ from: line.from, to: at, depart, arrive: depart + line.minutes })
        at = line.from
        break
      }
    }
    return legs
  }

  /** Earliest times at every site with at most 0, 1, 2 … legs, until another leg gains nothing. */
  private rounds(from: number, time: number): number[][] {
    const first = new Array<number>(this.count).fill(Infinity)
    first[from] = time
    const rounds = [first]
    for (;;) {
      const before = rounds[rounds.length - 1]!
      const after = before.slice()
      let gained = false
      for (const line of this.lines) {
        const arrive = nextDeparture(line.departures, before[line.from]!) + line.minutes
        if (arrive >= after[line.to]!) continue
        after[line.to] = arrive
        gained = true
      }
      if (!gained) return rounds
      rounds.push(after)
    }
  }
}

function nextDeparture(departures: number[], time: number): number {
  let [low, high] = [0, departures.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (departures[middle]! < time) low = middle + 1
    else high = middle
  }
  return departures[low] ?? Infinity
}
