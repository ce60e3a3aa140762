import type { Bookings } from './bookings.ts'
import { findSlot } from './find-slot.ts'

/**
 * Places what has a fixed time, before all else: steps with a pinned start, then those that the plan before started within the frozen window
 * and that keep every rule beside started, pinned and other kept steps. `dropped` are not tried: what they wait for cannot be done in time.
 * Returns the anchored steps.
 */
export function anchor(bookings: Bookings, dropped: ReadonlySet<number>): Set<number> {
  const { layout } = bookings
  const { shop, steps, order } = layout
  const benchAt = new Map(shop.benches.map(({ id }, i) => [id, i]))
  const personAt = new Map(shop.people.map(({ id }, i) => [id, i]))
  const anchored = new Set<number>()
  const soonest = new Float64Array(steps.length)

  const pass = (tryAt: (i: number, from: number, latestEnd: number) => boolean) => {
    const latest = latestEnds(bookings)
    for (const i of order) {
      const { before, length, earliest, choices } = steps[i]!
      const from = before.reduce((time, each) => Math.max(time, soonest[each]!), earliest)
      if (!bookings.placed[i] && choices.length && !dropped.has(i) && tryAt(i, from, latest[i]!)) anchored.add(i)
      soonest[i] = bookings.placed[i]?.end ?? (choices.length && steps[i]!.step.pin?.start === undefined ? from + length : Infinity)
    }
  }
  pass((i, from, latestEnd) => {
    const start = steps[i]!.step.pin?.start
    if (start === undefined || start < from) return false
    for (const choice of steps[i]!.choices) {
      const slot = findSlot(bookings, i, choice, start, Math.min(latestEnd, start + steps[i]!.length))
      if (!slot) continue
      bookings.place(i, slot)
      return true
    }
    return false
  })
  pass((i, from, latestEnd) => {
    const { previous, pin } = steps[i]!.step
    if (!previous || pin?.start !== undefined) return false
    if (previous.start < shop.now || previous.start >= shop.now + shop.frozenMinutes || previous.start < from) return false
    const choice = steps[i]!.choices.find(({ bench }) => bench === benchAt.get(previous.bench))
    if (!choice) return false
    const person = previous.person === null ? null : (personAt.get(previous.person) ?? -1)
    const people = choice.people?.filter((each) => each.person === person) ?? null
    if (people ? !people.length : person !== null) return false
    const slot = findSlot(bookings, i, { ...choice, people }, previous.start, Math.min(latestEnd, previous.start + steps[i]!.length))
    if (slot) bookings.place(i, slot)
    return slot !== null
  })
  return anchored
}

/** By when each step must end for the steps placed so far that wait for it; Infinity where none does. */
export function latestEnds({ layout, placed }: Bookings): Float64Array {
  const { steps, order } = layout
  const latest = new Float64Array(steps.length).fill(Infinity)
  for (let at = order.length - 1; at >= 0; at--) {
    const i = order[at]!
    for (const next of steps[i]!.after) {
      // What has started does not wait any more.
      if (steps[next]!.fixed) continue
      latest[i] = Math.min(latest[i]!, placed[next]?.start ?? latest[next]! - steps[next]!.length)
    }
  }
  return latest
}
