import type { Bookings } from './build/bookings.ts'
import { construct } from './build/construct.ts'
import { rules } from './build/priority.ts'
import { layOut, type Layout } from './layout/layout.ts'
import type { Entry, Plan } from './plan.ts'
import type { Shop } from './shop.ts'
import { explain } from './tell/explain.ts'
import { jobFinishes } from './tell/job-finishes.ts'
import { lowerBound } from './tell/lower-bound.ts'
import { isBetter, score } from './tell/score.ts'
import { transfersOf } from './tell/transfers-of.ts'
import { whyUnplaced } from './tell/why-unplaced.ts'

/** How many steps all constructions together may place: keeps the time for a large shop in bounds. */
const stepsToPlace = 1500
/** How often a plan that leaves out steps which a bench could do is built again with these first. */
const rescues = 4

/** The plan of a shop that is already checked: the same shop gives the same plan, byte for byte. */
export function planShop(shop: Shop): Plan {
  const layout = layOut(shop)
  const bookings = bestConstruction(layout)
  const { steps } = layout
  const entries = bookings.placed
    .flatMap((placement, i) => (placement ? [{ i, start: placement.start }] : []))
    .sort((a, b) => a.start - b.start || a.i - b.i)
    .map(({ i }) => entry(bookings, i))
  const unplaced = layout.order.filter((i) => !bookings.placed[i]).map((i) => whyUnplaced(bookings, i))
  const [, weightedTardiness, , loadSpread] = score(bookings)
  const transfers = transfersOf(bookings)
  return {
    entries, transfers, unplaced,
    jobs: jobFinishes(bookings),
    totals: { weightedTardiness, transfers: transfers.length, loadSpread, lowerBound: steps.length ? lowerBound(layout) : 0 },
  }
}

function bestConstruction(layout: Layout): Bookings {
  const tries = Math.max(2, Math.min(rules.length, Math.floor(stepsToPlace / Math.max(1, layout.steps.length))))
  let best = { bookings: construct(layout, rules[0]!, new Set()), rule: rules[0]! }
  let reached = score(best.bookings)
  const consider = (rule: (typeof rules)[number], urgent: ReadonlySet<number>) => {
    const bookings = construct(layout, rule, urgent)
    const gained = score(bookings)
    if (isBetter(gained, reached)) [best, reached] = [{ bookings, rule }, gained]
    return bookings
  }
  for (const rule of rules.slice(1, tries)) consider(rule, new Set())

  const urgent = new Set<number>()
  let last = best.bookings
  for (let round = 0; round < rescues && reached[0] > 0; round++) {
    const before = urgent.size
    for (const i of leftOut(last)) urgent.add(i)
    if (urgent.size === before) break
    last = consider(best.rule, urgent)
  }
  return best.bookings
}

/** Steps left out although a bench could do them, with all that they wait for. */
function leftOut({ layout, placed }: Bookings): Set<number> {
  const { steps, order } = layout
  const possible = new Uint8Array(steps.length)
  for (const i of order) possible[i] = steps[i]!.fixed || (steps[i]!.choices.length && steps[i]!.before.every((each) => possible[each])) ? 1 : 0
  const found = new Set(order.filter((i) => !placed[i] && possible[i]))
  for (const i of found) for (const before of steps[i]!.before) if (!steps[before]!.fixed) found.add(before)
  return found
}

function entry(bookings: Bookings, i: number): Entry {
  const { shop, steps } = bookings.layout
  const { bench, person, start, end } = bookings.placed[i]!
  const placed = { step: steps[i]!.step.id, bench: shop.benches[bench]!.id, person: person === null ? null : shop.people[person]!.id, start, end }
  return steps[i]!.fixed ? placed : { ...placed, why: explain(bookings, i) }
}
