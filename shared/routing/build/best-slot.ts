import type { Choice } from '../layout/layout.ts'
import type { Bookings } from './bookings.ts'
import { findSlot, type Slot } from './find-slot.ts'

/** How many further steps of a sample are looked at when a site is chosen. */
const ahead = 5

/**
 * The placement of a step that lets its sample be done soonest: of each site the earliest end (of benches that tie the one that can do less),
 * of these the one from which the sample's next steps, at sites that can do them and couriers between, end first. Ties go to the earlier end,
 * then to the site where the sample is.
 */
export function bestSlot(bookings: Bookings, step: number, from: number, latestEnd = Infinity): Slot | null {
  const { layout, tracks } = bookings
  const { choices, sample, sites } = layout.steps[step]!
  if (sites.length === 1) return bestAt(bookings, step, sites[0]!, choices, from, latestEnd)
  const rest = laterSteps(bookings, step)
  const here = tracks[sample]!.stays.at(-1)?.site ?? layout.sampleSites[sample]!
  let best: { slot: Slot; site: number; done: number } | null = null
  for (const site of sites) {
    const slot = bestAt(bookings, step, site, choices, from, latestEnd)
    if (!slot) continue
    const done = doneBy(bookings, rest, site, slot.end)
    const isBetter = !best || done < best.done || (done === best.done && (slot.end < best.slot.end || (slot.end === best.slot.end && site === here)))
    if (isBetter) best = { slot, site, done }
  }
  return best?.slot ?? null
}

function bestAt(bookings: Bookings, step: number, site: number, choices: Choice[], from: number, latestEnd: number): Slot | null {
  const { benchSites, shop } = bookings.layout
  let best: Slot | null = null
  let breadth = Infinity
  for (const choice of choices) {
    if (benchSites[choice.bench] !== site) continue
    const does = shop.benches[choice.bench]!.does.length
    const slot = findSlot(bookings, step, choice, from, best ? Math.min(latestEnd, does < breadth ? best.end : best.end - 1) : latestEnd)
    if (!slot) continue
    best = slot
    breadth = does
  }
  return best
}

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
  let [places, times] = [[site], [time]]
  for (const next of rest) {
    const { sites, length } = layout.steps[next]!
    const then = sites.map((to) => {
      let soonest = Infinity
      for (let i = 0; i < places.length; i++) soonest = Math.min(soonest, layout.couriers.arrival(places[i]!, to, times[i]!))
      return soonest + length
    })
    places = sites
    times = then
  }
  return times.reduce((least, each) => Math.min(least, each), Infinity)
}
