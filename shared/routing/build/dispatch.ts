import type { Bookings } from './bookings.ts'
import { bestSlot } from './best-slot.ts'
import { firstInside } from '../time/first-inside.ts'
import { TimeQueue } from './time-queue.ts'

/** Steps that compete for the same benches. `clock`: none of those waiting can start before it. */
type Group = { benches: number[]; future: TimeQueue; waiting: number[]; clock: number; failures: number; next: number; best: number; bestIndex: number; bestAt: number }

/** How many waiting steps of a group may fail to start at one time before its clock moves on: bounds the search where many wait. */
const patience = 6

/**
 * Places the steps of `todo` forward in time: at each time the step with the greatest `index` among those that can start then.
 * Stops at the first step that cannot be placed if `strict`, and returns it; otherwise leaves it and what depends on it out.
 */
export function dispatch(
  bookings: Bookings, todo: number[], index: (step: number, time: number) => number, latestEnd: Float64Array, strict: boolean,
): number | null {
  const { steps } = bookings.layout
  const isTodo = new Uint8Array(steps.length)
  for (const step of todo) isTodo[step] = 1
  const missing = new Int32Array(steps.length)
  const groups = new Map<string, Group>()
  const groupOf = new Map<number, Group>()

  const release = (step: number) => {
    const group = groupOf.get(step)!
    const ready = bookings.ready(step)
    group.future.push(ready, step)
    group.clock = Math.min(group.clock, ready)
  }
  for (const step of todo) {
    const benches = steps[step]!.choices.map(({ bench }) => bench)
    const key = benches.join()
    const group = groups.get(key) ?? { benches, future: new TimeQueue(), waiting: [], clock: Infinity, failures: 0, next: Infinity, best: -1, bestIndex: 0, bestAt: -1 }
    groups.set(key, group)
    groupOf.set(step, group)
    missing[step] = steps[step]!.before.filter((each) => !bookings.placed[each]).length
  }
  for (const step of todo) {
    if (missing[step]) continue
    if (steps[step]!.choices.length) release(step)
    else if (strict) return step
  }

  const all = [...groups.values()]
  for (;;) {
    const time = all.reduce((least, group) => Math.min(least, group.clock), Infinity)
    if (time === Infinity) return strict ? (todo.find((step) => !bookings.placed[step]) ?? null) : null
    let chosen: Group | null = null
    for (const group of all) {
      if (group.clock !== time) continue
      gather(group, time)
      if (group.bestAt < 0 && !pickBest(bookings, group, time, index)) continue
      if (!chosen || group.bestIndex > chosen.bestIndex) chosen = group
    }
    if (!chosen) continue

    const step = chosen.waiting[chosen.bestAt]!
    chosen.waiting[chosen.bestAt] = chosen.waiting[chosen.waiting.length - 1]!
    chosen.waiting.pop()
    chosen.bestAt = -1
    const slot = bestSlot(bookings, step, time, latestEnd[step])
    if (!slot) {
      if (strict) return step
    } else if (slot.start > time) {
      chosen.future.push(slot.start, step)
      chosen.next = Math.min(chosen.next, slot.start)
      if (++chosen.failures >= patience) advance(chosen, chosen.next)
    } else {
      bookings.place(step, slot)
      for (const next of steps[step]!.after) if (isTodo[next] && --missing[next]! === 0 && steps[next]!.choices.length) release(next)
    }
  }
}

/** Takes in what is ready; where nothing is, moves the group's clock on. */
function gather(group: Group, time: number): void {
  while (group.future.first <= time) {
    group.waiting.push(group.future.pop()!)
    group.bestAt = -1
  }
  if (!group.waiting.length) advance(group, group.future.first)
}

function advance(group: Group, time: number): void {
  group.clock = Math.min(time, group.future.first)
  group.failures = 0
  group.next = Infinity
  group.bestAt = -1
}

/** Finds the waiting step with the greatest index, unless every bench of the group is shut or taken. */
function pickBest({ layout, benches }: Bookings, group: Group, time: number, index: (step: number, time: number) => number): boolean {
  if (!group.waiting.length) return false
  let free = Infinity
  for (const bench of group.benches) {
    const { open, units } = layout.shop.benches[bench]!
    let at = time
    for (let before = -Infinity; before !== at && at < free; ) {
      before = at
      at = firstInside(open, benches[bench]!.firstFree(at, 1, units), 1)
    }
    free = Math.min(free, at)
    if (free <= time) break
  }
  if (free > time) {
    if (free === Infinity) group.waiting.length = 0
    advance(group, free)
    return false
  }
  for (let i = 0; i < group.waiting.length; i++) {
    const value = index(group.waiting[i]!, time)
    if (group.bestAt >= 0 && (value < group.bestIndex || (value === group.bestIndex && group.waiting[i]! > group.waiting[group.bestAt]!))) continue
    group.bestAt = i
    group.bestIndex = value
  }
  return true
}
