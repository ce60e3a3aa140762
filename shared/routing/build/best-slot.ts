import type { Choice } from '../layout/layout.ts'
import type { Bookings } from './bookings.ts'
import { findSlot, type Slot } from './find-slot.ts'

/** How many further steps of a sample are looked at when a site is chosen. */
const ahead = 5

/**
 * The placement of a step that lets its sample be done soonest: of each bench the earliest start, of these the one from which the sample's
 * next steps, at sites that can do them and couriers between, end first. Ties go to the earlier end, the shorter way, the bench that can do less.
 */
export function bestSlot(bookings: Bookings, step: number, from: number, latestEnd = Infinity): Slot | null {
  const { layout, tracks } = bookings
  const { choices, sample, sites } = layout.steps[step]!
  const rest = layout.shop.sites.length > 1 ? laterSteps(bookings, step) : []
  const stays = sites.length > 1 || rest.some((each) => layout.steps[each]!.sites.length > 1 || layout.steps[each]!.sites[0] !== sites[0])
  let best: { slot: Slot; cost: number[] } | null = null
  for (const choice of choices) {
    if (best && !stays && latestEnd > best.slot.end + 1) latestEnd = best.slot.end
    const slot = findSlot(bookings, step, choice, from, latestEnd)
    if (!slot) continue
    const site = layout.benchSites[choice.bench]!
    const cost = [stays ? doneBy(bookings, rest, site, slot.end) : slot.end, slot.end, stays ? moves(tracks[sample]!.stays.at(-1)?.site ?? layout.sampleSites[sample]!, site) : 0, breadth(bookings, choice)]
    if (!best || isLess(cost, best.cost)) best = { slot, cost }
  }
  return best?.slot ?? null
}

const moves = (from: number, to: number) => (from === to ? 0 : 1)
const breadth = ({ layout }: Bookings, { bench }: Choice) => layout.shop.benches[bench]!.does.length

function laterSteps({ layout, placed }: Bookings, step: number): number[] {
  const mine = layout.bySample[layout.steps[step]!.sample]!
  const later: number[] = []
  for (let i = mine.indexOf(step) + 1; i < mine.length && later.length < ahead; i++) {
    const next = mine[i]!
    if (!placed[next] && layout.steps[next]!.sites.length) later.push(next)
  }
  return later
}

/** The earliest end of `rest`, done in this order on free benches that never close, for a sample that is free at `site` at `time`. */
function doneBy({ layout }: Bookings, rest: number[], site: number, time: number): number {
  let at = new Map([[site, time]])
  for (const next of rest) {
    const { sites, length } = layout.steps[next]!
    const then = new Map<number, number>()
    for (const to of sites) {
      let soonest = Infinity
      for (const [here, free] of at) soonest = Math.min(soonest, layout.couriers.arrival(here, to, free) + length)
      then.set(to, soonest)
    }
    at = then
  }
  return Math.min(...at.values())
}

function isLess(a: number[], b: number[]): boolean {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return a[i]! < b[i]!
  return false
}
