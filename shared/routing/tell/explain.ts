import { findSlot, type Slot } from '../build/find-slot.ts'
import type { Bookings } from '../build/bookings.ts'
import type { Placement } from '../layout/layout.ts'
import type { Why } from '../plan.ts'
import { barSentence } from './bar-sentence.ts'
import { benchBars } from './bench-bars.ts'

const shown = 5

/**
 * Why a step stands where it stands, judged in the finished plan: the step is lifted out and each bench asked for the first place it
 * would have there while everything else stays. So each sentence is true of the plan that it comes with.
 */
export function explain(bookings: Bookings, i: number): Why {
  const { layout, tracks } = bookings
  const { shop, steps, benchSites } = layout
  const { choices, sample, step } = steps[i]!
  const placement = bookings.remove(i)
  if (!placement) throw new RangeError(`step '${step.id}' is not placed`)
  const track = tracks[sample]!
  tracks[sample] = track.upTo(placement.start)
  const ready = bookings.ready(i)
  const kept = keptBecause(bookings, i, placement)

  const others: { bench: string; because: string; end: number }[] = []
  let here: Slot | null = null
  for (const choice of choices) {
    const slot = findSlot(bookings, i, choice, ready)
    if (choice.bench === placement.bench) here = slot
    else others.push({ bench: shop.benches[choice.bench]!.id, because: lost(slot, placement, benchSites[choice.bench] === benchSites[placement.bench], kept !== null, shop.horizon), end: slot?.end ?? Infinity })
  }
  tracks[sample] = track
  bookings.place(i, placement)

  others.sort((a, b) => (a.end === b.end ? 0 : a.end - b.end))
  const rejected = others.map(({ bench, because }) => ({ bench, because }))
  if (rejected.length < shown) {
    for (const { bench, bar } of benchBars(layout, i)) rejected.push({ bench: shop.benches[bench]!.id, because: barSentence(bar, step, shop.benches[bench]!) })
  }
  const soonest = others.every(({ end }) => end >= placement.end) ? (others.length ? '; no other bench ends it sooner' : '; the only bench that can do it') : ''
  return { chosen: (kept ?? reason(bookings, i, placement, here)) + (kept ? '' : soonest), rejected: rejected.slice(0, shown) }
}

function keptBecause({ layout }: Bookings, i: number, { bench, person, start }: Placement): string | null {
  const { shop, steps } = layout
  const { pin, previous } = steps[i]!.step
  if (pin?.start !== undefined) return `The start is pinned to minute ${start}`
  const isBefore = previous?.start === start && previous.bench === shop.benches[bench]!.id && previous.person === (person === null ? null : shop.people[person]!.id)
  return isBefore && start < shop.now + shop.frozenMinutes ? 'Stays as planned before: it starts within the frozen window' : null
}

function lost(slot: Slot | null, { end }: Placement, sameSite: boolean, kept: boolean, horizon: number): string {
  if (!slot) return `has no time for it that ends by minute ${horizon} and by its calibration and authorisations`
  if (slot.end > end) return `would end at minute ${slot.end}, ${slot.end - end} min later`
  const there = slot.end === end ? `would end at minute ${end} too` : `could end at minute ${slot.end}`
  if (kept) return `${there}, but the step keeps its place`
  return sameSite ? `${there}, but nothing is gained for the job` : `${there}, but at another site, where the sample would be done no sooner`
}

/** What set the start: the last rule that held it back on its bench. */
function reason({ layout, placed, tracks }: Bookings, i: number, placement: Placement, here: Slot | null): string {
  const { shop, steps } = layout
  const { before, earliest, sample } = steps[i]!
  const { start } = placement
  const bench = shop.benches[placement.bench]!.id
  const person = placement.person === null ? '' : shop.people[placement.person]!.id
  const ends = `ends at minute ${placement.end}`
  if (here && here.start < start) return `Starts on ${bench} at minute ${start}, after steps that go first; ${ends}`
  switch (here?.holdup) {
    case 'bench-hours': return `Starts when ${bench} has open time for it, at minute ${start}; ${ends}`
    case 'bench-busy': return `Starts when ${bench} is free, at minute ${start}; ${ends}`
    case 'person-hours': return `Starts when ${person} is there, at minute ${start}; ${ends}`
    case 'person-busy': return `Starts when ${person} is free, at minute ${start}; ${ends}`
    case 'sample': {
      const track = tracks[sample]!
      const from = track.before(track.stays.findIndex((stay) => stay.step === i))
      const by = from.site === layout.benchSites[placement.bench] ? 'is free' : 'arrives by courier'
      return `Starts when sample ${shop.samples[sample]!.id} ${by}, at minute ${start}; ${ends}`
    }
    case 'ready':
    case undefined: {
      const last = before.find((each) => placed[each]?.end === start)
      if (last !== undefined) return `Starts on ${bench} as soon as ${steps[last]!.step.id} ends, at minute ${start}; ${ends}`
      return start === earliest && earliest > shop.now
        ? `Starts on ${bench} as soon as the sample is available, at minute ${start}; ${ends}`
        : `Starts on ${bench} at once, at minute ${start}; ${ends}`
    }
  }
}
