import type { Choice, Placement } from '../layout/layout.ts'
import { firstInside } from '../time/first-inside.ts'
import type { Bookings } from './bookings.ts'

/** What last held a start back. */
export type Holdup = 'ready' | 'sample' | 'bench-hours' | 'bench-busy' | 'person-hours' | 'person-busy'
export type Slot = Placement & { holdup: Holdup }

/**
 * The earliest placement of a step on one bench, starting at or after `from` and ending by `latestEnd`, with the person who can begin first;
 * null if there is none. Every rule moves the start forward until none moves it any more.
 */
export function findSlot(bookings: Bookings, step: number, choice: Choice, from: number, latestEnd = Infinity): Slot | null {
  const alone = settle(bookings, step, choice, null, from, Math.min(choice.until, latestEnd))
  if (!alone || !choice.people) return alone
  let best: Slot | null = null
  for (const { person, until } of choice.people) {
    const limit = Math.min(choice.until, latestEnd, until, best ? best.end - 1 : Infinity)
    const slot = settle(bookings, step, choice, person, alone.start, limit)
    if (!slot) continue
    best = slot.start === alone.start ? { ...slot, holdup: alone.holdup } : slot
    if (slot.start === alone.start) break
  }
  return best
}

function settle(bookings: Bookings, step: number, choice: Choice, person: number | null, from: number, limit: number): Slot | null {
  const { layout, benches, people, tracks } = bookings
  const { length, openLength, attendedLength, sample } = layout.steps[step]!
  const bench = layout.shop.benches[choice.bench]!
  const site = layout.benchSites[choice.bench]!
  const personOpen = person === null ? null : layout.shop.people[person]!.open
  const booked = Math.max(1, length)
  const attended = Math.max(1, attendedLength)
  let holdup: Holdup = 'ready'
  let start = from
  for (;;) {
    const before = start
    let next = tracks[sample]!.firstFree(site, start, length)
    if (next > start) [start, holdup] = [next, 'sample']
    if (start + length > limit) return null
    next = firstInside(bench.open, start, openLength)
    if (next > start) [start, holdup] = [next, 'bench-hours']
    if (start + length > limit) return null
    next = benches[choice.bench]!.firstFree(start, booked, bench.units)
    if (next > start) [start, holdup] = [next, 'bench-busy']
    if (person !== null && personOpen) {
      next = firstInside(personOpen, start, attended)
      if (next > start) [start, holdup] = [next, 'person-hours']
      if (start + length > limit) return null
      next = people[person]!.firstFree(start, attended, 1)
      if (next > start) [start, holdup] = [next, 'person-busy']
    }
    if (start + length > limit) return null
    if (start === before) return { bench: choice.bench, person, start, end: start + length, holdup }
  }
}
