import type { Layout } from '../layout/layout.ts'
import { anchor, latestEnds } from './anchor.ts'
import { Bookings } from './bookings.ts'
import { bestSlot } from './best-slot.ts'
import { dispatch } from './dispatch.ts'
import { priority, type Rule } from './priority.ts'

/**
 * One plan by one priority rule: fixed times first, then what these wait for, then everything else. `urgent` steps go before all others.
 * A kept step gives way when what it waits for cannot be done before it; then the construction begins again without it.
 */
export function construct(layout: Layout, rule: Rule, urgent: ReadonlySet<number>): Bookings {
  const index = priority(layout, rule)
  const dropped = new Set<number>()
  for (;;) {
    const bookings = new Bookings(layout)
    const anchored = anchor(bookings, dropped)
    const latest = latestEnds(bookings)
    const open = layout.order.filter((i) => !bookings.placed[i] && isFree(layout, i))
    const waitedFor = open.filter((i) => latest[i] !== Infinity)
    const failed = waitedFor.length ? dispatch(bookings, waitedFor, (step) => -latest[step]!, latest, true) : null
    if (failed !== null) {
      for (const step of tooEarly(bookings, anchored, failed)) dropped.add(step)
      continue
    }
    const rest = open.filter((i) => latest[i] === Infinity)
    dispatch(bookings, rest, urgent.size ? (step, time) => index(step, time) + (urgent.has(step) ? 1e9 : 0) : index, latest, false)
    return bookings
  }
}

/** A step with a pinned start is placed as an anchor or not at all. */
const isFree = ({ steps }: Layout, i: number) => steps[i]!.step.pin?.start === undefined

/** The anchored steps that wait, over any others, for a step that can't be done before them: those too early for it, or all. */
function tooEarly(bookings: Bookings, anchored: Set<number>, failed: number): number[] {
  const { steps } = bookings.layout
  const seen = new Set([failed])
  const found: number[] = []
  for (const step of seen) {
    for (const next of steps[step]!.after) {
      if (seen.has(next)) continue
      if (anchored.has(next)) found.push(next)
      else seen.add(next)
    }
  }
  const ready = bookings.ready(failed)
  const end = ready === Infinity ? Infinity : (bestSlot(bookings, failed, ready)?.end ?? Infinity)
  const early = found.filter((step) => bookings.placed[step]!.start < end)
  return early.length ? early : found
}
