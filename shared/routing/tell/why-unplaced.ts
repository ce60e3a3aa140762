import type { Bookings } from '../build/bookings.ts'
import { findSlot } from '../build/find-slot.ts'
import type { Layout } from '../layout/layout.ts'
import type { Unplaced } from '../plan.ts'
import { whyBarred } from './why-barred.ts'

/** Why a step is not placed and what would help. */
export function whyUnplaced(bookings: Bookings, i: number): Unplaced {
  const { layout, placed } = bookings
  const { step, before, choices } = layout.steps[i]!
  const waitsFor = before.filter((each) => !placed[each]).map((each) => layout.steps[each]!.step.id)
  const [because, cures] = !choices.length ? whyBarred(layout, i)
    : waitsFor.length ? [`waits for ${waitsFor.join(', ')}, which cannot be placed`, waitsFor.map((id) => `Make ${id} possible: see there`)]
      : step.pin?.start !== undefined ? whyNotPinned(bookings, i, step.pin.start)
        : whyNoTime(bookings, i)
  return { step: step.id, because, cures }
}

type Told = [because: string, cures: string[]]

function whyNotPinned(bookings: Bookings, i: number, start: number): Told {
  const { shop, steps } = bookings.layout
  const { earliest, before, choices, length } = steps[i]!
  const cures = ['Move or remove the pinned start']
  if (start < shop.now) return [`the pinned start, minute ${start}, is before now, minute ${shop.now}`, cures]
  if (start < earliest) return [`the pinned start, minute ${start}, is before the sample is available, minute ${earliest}`, cures]
  const late = before.find((each) => (bookings.placed[each]?.end ?? Infinity) > start)
  if (late !== undefined) return [`${steps[late]!.step.id} ends at minute ${bookings.placed[late]?.end}, after the pinned start, minute ${start}`, cures]
  const next = choices.flatMap((choice) => findSlot(bookings, i, choice, start) ?? []).sort((a, b) => a.start - b.start)[0]
  const benches = choices.map(({ bench }) => shop.benches[bench]!.id).join(', ')
  if (!next) return [`neither at the pinned start, minute ${start}, nor later is there time for its ${length} min on ${benches}`, [...cures, 'Open longer, or plan further ahead']]
  return [`at the pinned start, minute ${start}, sample, bench and person are not free and open together on ${benches}`, [`Move the pinned start to minute ${next.start}`, ...cures]]
}

function whyNoTime(bookings: Bookings, i: number): Told {
  const { layout } = bookings
  const { shop, steps } = layout
  const { choices, length, openLength, step, sample } = steps[i]!
  const ready = bookings.ready(i)
  const track = bookings.tracks[sample]!
  const from = track.before(track.stays.length)
  const sites = [...new Set(choices.map(({ bench }) => layout.benchSites[bench]!))]
  const benches = choices.map(({ bench }) => shop.benches[bench]!.id).join(', ')
  if (sites.every((site) => layout.couriers.arrival(from.site, site, from.at) === Infinity)) {
    const to = sites.map((site) => shop.sites[site]!.id).join(' or ')
    return [`no courier takes sample ${shop.samples[sample]!.id} from site ${shop.sites[from.site]!.id} to ${to} after minute ${from.at}`, [`Add a courier from ${shop.sites[from.site]!.id} to ${to}`]]
  }
  const free = choices.flatMap((choice) => findSlot(bookings, i, unbounded(choice), ready) ?? []).sort((a, b) => a.end - b.end)[0]
  if (!free && !fitsOpenHours(layout, i)) {
    return [`no open time of ${benches}${step.attended === 'none' ? '' : ' and of a person who may attend it'} holds ${openLength} min in one piece`, ['Open longer without a break', 'Split the step']]
  }
  if (!free) return [`there is no free time for its ${length} min on ${benches} from minute ${ready} on`, ['Open further hours', 'Free the bench or the person of other work']]
  if (free.end > shop.horizon) return [`it would end at minute ${free.end} at the soonest, after the horizon, minute ${shop.horizon}`, [`Plan to minute ${free.end} or further`, 'Open further hours', 'Free the bench or the person of other work']]
  return [`when it could be done, from minute ${free.start} to ${free.end}, ${shop.benches[free.bench]!.id} is out of calibration or the authorisation has ended`, ['Renew the calibration or the authorisation', 'Give the step priority']]
}

const unbounded = (choice: Layout['steps'][number]['choices'][number]) => ({
  bench: choice.bench, until: 1e12, people: choice.people?.map(({ person }) => ({ person, until: 1e12 })) ?? null,
})

function fitsOpenHours({ shop, steps }: Layout, i: number): boolean {
  const { choices, openLength, attendedLength } = steps[i]!
  return choices.some(({ bench, people }) => shop.benches[bench]!.open.some(([from, to]) => to - from >= openLength
    && (!people || people.some(({ person }) => shop.people[person]!.open.some(([comes, goes]) => Math.min(goes, to) - Math.max(comes, from) >= attendedLength)))))
}
