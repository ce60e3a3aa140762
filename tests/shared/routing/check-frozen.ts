import type { Plan } from '../../../shared/routing/plan.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { attendedMinutes, byId, lengthOf, placementFaults } from './check-plan.ts'

/**
 * Steps that stood within the frozen window and were moved though they could have stayed: their earlier placement keeps every rule
 * beside started steps, steps with a pinned start and kept steps, and all that they wait for ends before it in the plan.
 */
export function whyFrozenMoved(shop: Shop, plan: Plan): string[] {
  const entryOf = (id: string) => plan.entries.find(({ step }) => step === id)
  const isFrozen = (step: Shop['steps'][number]) => !step.state && step.pin?.start === undefined && step.previous !== undefined
    && step.previous.start >= shop.now && step.previous.start < shop.now + shop.frozenMinutes
  const stayed = (step: Shop['steps'][number]) => {
    const entry = entryOf(step.id)
    return isFrozen(step) && entry?.start === step.previous?.start && entry?.bench === step.previous?.bench && entry?.person === step.previous?.person
  }
  const firm = shop.steps.filter((step) => step.state === 'started' || (!step.state && step.pin?.start !== undefined) || stayed(step))
    .flatMap((step) => {
      const entry = entryOf(step.id)
      return entry ? [{ step, entry }] : []
    })

  return shop.steps.flatMap((step) => {
    const { previous } = step
    if (!isFrozen(step) || stayed(step) || !previous) return []
    const bench = byId(shop.benches, previous.bench)
    const sample = byId(shop.samples, step.sample)
    const [start, end] = [previous.start, previous.start + lengthOf(step)]
    if (!bench || !sample || placementFaults(shop, step, { ...previous, end }).length) return []
    // A step without length may be kept out by a planner that gives it a minute.
    if (start === end) return []
    const waited = step.after.flatMap((id) => {
      const before = byId(shop.steps, id)
      return before && before.state !== 'done' ? [{ step: before, entry: entryOf(id) }] : []
    })
    if (waited.some(({ entry }) => !entry || entry.end > start)) return []
    const held = (id: string) => firm.filter(({ entry }) => entry.bench === id)
    const points = [start, ...held(bench.id).map(({ entry }) => entry.start).filter((time) => time > start && time < end)]
    if (points.some((time) => held(bench.id).filter(({ entry }) => entry.start <= time && time < Math.max(entry.end, entry.start + 1)).length >= bench.units)) return []
    const busy = firm.some(({ step: other, entry }) => previous.person !== null && entry.person === previous.person
      && entry.start < start + attendedMinutes(step) && start < entry.start + Math.max(1, attendedMinutes(other)))
    if (busy) return []
    const stays = [...firm, ...waited].flatMap(({ step: other, entry }) => {
      const site = byId(shop.benches, entry?.bench ?? null)?.site
      return entry && site !== undefined && other.sample === step.sample ? [{ ...entry, site }] : []
    })
    if (stays.some((each) => each.start < end && start < each.end)) return []
    const before = stays.filter((each) => each.end <= start).sort((a, b) => a.end - b.end).at(-1)
    const after = stays.filter((each) => each.start >= end).sort((a, b) => a.start - b.start)[0]
    const from = before ?? { site: sample.site, end: Math.max(shop.now, sample.availableFrom) }
    if (soonestAt(shop, from.site, bench.site, from.end) > start) return []
    if (after && soonestAt(shop, bench.site, after.site, end) > after.start) return []
    if (waitsTooEarly(shop, step.id, end, firm)) return []
    return [`${step.id} was moved out of the frozen window though it could stay`]
  })
}

/** Whether a firm step that waits for this one, over any others, starts before it could. */
function waitsTooEarly(shop: Shop, id: string, end: number, firm: { step: { id: string; state?: string }; entry: { start: number } }[]): boolean {
  return shop.steps.filter(({ after }) => after.includes(id)).some((next) => {
    const mine = firm.find((each) => each.step.id === next.id)
    if (mine) return mine.step.state !== 'started' && mine.entry.start < end
    return !next.state && waitsTooEarly(shop, next.id, end + lengthOf(next), firm)
  })
}

/** Earliest arrival by couriers, by trying every departure until nothing gets sooner. */
function soonestAt(shop: Shop, from: string, to: string, time: number): number {
  const at = new Map([[from, time]])
  for (let changed = true; changed; ) {
    changed = false
    for (const site of shop.sites) {
      for (const line of site.courier) {
        for (const depart of line.departures) {
          if (depart < shop.now || depart < (at.get(site.id) ?? Infinity) || depart + line.minutes >= (at.get(line.to) ?? Infinity)) continue
          at.set(line.to, depart + line.minutes)
          changed = true
        }
      }
    }
  }
  return at.get(to) ?? Infinity
}
