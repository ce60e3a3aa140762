import type { Plan } from '../../../shared/routing/plan.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { whyFrozenMoved } from './check-frozen.ts'
import { findTotalsFaults } from './check-totals.ts'

/* Written from the contract alone: imports types of the planner and none of its code. Slow and plain on purpose. */

type Step = Shop['steps'][number]
type Entry = Plan['entries'][number]

export const lengthOf = (step: Step) => step.setupMinutes + step.runMinutes
export const attendedMinutes = (step: Step) => (step.attended === 'all' ? lengthOf(step) : step.attended === 'setup' ? step.setupMinutes : 0)
export const byId = <T extends { id: string }>(list: T[], id: string | null) => list.find((each) => each.id === id)
const overlap = (a: { start: number; end: number }, b: { start: number; end: number }) => a.start < b.end && b.start < a.end

/** Every hard rule that a plan breaks, as sentences. */
export function checkPlan(shop: Shop, plan: Plan): string[] {
  const faults: string[] = []
  const entries = new Map(plan.entries.map((entry) => [entry.step, entry]))
  const unplaced = new Set(plan.unplaced.map(({ step }) => step))
  if (entries.size !== plan.entries.length) faults.push('a step is placed twice')
  for (const { step } of [...plan.entries, ...plan.unplaced]) if (!byId(shop.steps, step)) faults.push(`unknown step ${step}`)
  for (const step of shop.steps) {
    const entry = entries.get(step.id)
    if (entry && unplaced.has(step.id)) faults.push(`${step.id} is both placed and unplaced`)
    if (step.actual && step.state) {
      const { bench, person, start } = step.actual
      if (!entry && step.state === 'started') faults.push(`${step.id} has started and is missing`)
      const end = step.actual.end ?? Math.max(shop.now, start + lengthOf(step))
      if (entry && (entry.bench !== bench || entry.person !== person || entry.start !== start || entry.end !== end)) faults.push(`${step.id} is ${step.state} and was changed`)
      continue
    }
    if (!entry) {
      if (!unplaced.has(step.id)) faults.push(`${step.id} is neither placed nor unplaced`)
      continue
    }
    for (const fault of placementFaults(shop, step, entry)) faults.push(`${step.id} ${fault}`)
    for (const id of step.after) {
      const before = byId(shop.steps, id)
      const end = before?.state === 'done' ? before.actual?.end : entries.get(id)?.end
      if (end === undefined) faults.push(`${step.id} is placed without ${id}, which it waits for`)
      else if (end > entry.start) faults.push(`${step.id} starts before ${id} ends`)
    }
    if (!entry.why?.chosen) faults.push(`${step.id} is not explained`)
  }
  for (const { step, because, cures } of plan.unplaced) if (!because || !cures.length) faults.push(`${step} has no reason or no cure`)
  faults.push(...capacityFaults(shop, plan), ...sampleFaults(shop, plan), ...whyFrozenMoved(shop, plan), ...findTotalsFaults(shop, plan))
  return faults
}

/** What is wrong with one placement by itself, whatever else is planned. */
export function placementFaults(shop: Shop, step: Step, entry: Pick<Entry, 'bench' | 'person' | 'start' | 'end'>): string[] {
  const faults: string[] = []
  const bench = byId(shop.benches, entry.bench)
  const sample = byId(shop.samples, step.sample)
  if (!bench || !sample) return ['is on an unknown bench']
  const { start, end } = entry
  if (end !== start + lengthOf(step)) faults.push('has the wrong length')
  if (start < shop.now) faults.push('starts before now')
  if (start < sample.availableFrom) faults.push('starts before its sample is available')
  if (end > shop.horizon) faults.push('ends after the horizon')
  const does = bench.does.filter(({ kind }) => kind === step.kind)
  if (!does.length) faults.push('is on a bench that does not do its kind')
  const isWithin = (limits: Record<string, [number, number]>) => Object.entries(step.needs).every(([need, value]) => {
    const limit = Object.entries(limits).find(([name]) => name === need)?.[1]
    return limit && value >= limit[0] && value <= limit[1]
  })
  if (does.length && !does.some(({ limits }) => isWithin(limits))) faults.push('is outside the limits of its bench')
  if (bench.out) faults.push('is on a bench that is out')
  if (end > bench.usableUntil) faults.push('ends after its bench is usable')
  if (step.scope !== null && !byId(shop.sites, bench.site)?.scope.includes(step.scope)) faults.push('is at a site without its scope')
  if (step.pin?.bench !== undefined && step.pin.bench !== bench.id) faults.push('is not on its pinned bench')
  if (step.pin?.start !== undefined && step.pin.start !== start) faults.push('does not start when pinned')
  if (step.pin?.person != null && step.pin.person !== entry.person) faults.push('is not with its pinned person')
  const attended = attendedMinutes(step)
  const isOpen = (open: [number, number][], minutes: number) => open.some(([from, to]) => from <= start && start + minutes <= to && start < to)
  if (!isOpen(bench.open, attended)) faults.push('is outside the open hours of its bench')
  if (step.attended === 'none') return entry.person === null ? faults : [...faults, 'has a person though nobody attends it']
  const person = byId(shop.people, entry.person)
  if (!person) return [...faults, 'has no person']
  if (person.site !== bench.site) faults.push('has a person of another site')
  if (!isOpen(person.open, attended)) faults.push('is outside the hours of its person')
  if (!person.may.some(({ kind, until }) => kind === step.kind && until >= end)) faults.push('has a person who is not authorised to its end')
  return faults
}

/** Minutes during which a plan's entry holds its person. */
export function personHold(step: Step, entry: Entry) {
  return { start: entry.start, end: entry.start + attendedMinutes(step) }
}

function capacityFaults(shop: Shop, plan: Plan): string[] {
  const faults: string[] = []
  const running = plan.entries.filter(({ step }) => byId(shop.steps, step)?.state !== 'done')
  const isNew = (entry: Entry) => !byId(shop.steps, entry.step)?.state
  for (const bench of shop.benches) {
    const mine = running.filter((entry) => entry.bench === bench.id)
    for (const { start, step } of mine.filter(isNew)) {
      const held = mine.filter((each) => each.step !== step && each.start <= start && start < each.end).length
      if (held + 1 > bench.units) faults.push(`${bench.id} holds more than ${bench.units} at ${start}`)
    }
    for (const entry of mine.filter(isNew)) {
      if (bench.units === 1 && mine.some((each) => each.step !== entry.step && overlap(each, entry))) faults.push(`${bench.id} holds two steps during ${entry.step}`)
    }
  }
  for (const person of shop.people) {
    const holds = running.filter((entry) => entry.person === person.id).map((entry) => ({ entry, ...personHold(byId(shop.steps, entry.step)!, entry) }))
    holds.forEach((a, i) => holds.slice(i + 1).forEach((b) => {
      if ((isNew(a.entry) || isNew(b.entry)) && overlap(a, b)) faults.push(`${person.id} does ${a.entry.step} and ${b.entry.step} at once`)
    }))
  }
  return faults
}

/** Follows each sample through its steps and transfers. */
function sampleFaults(shop: Shop, plan: Plan): string[] {
  const faults: string[] = []
  for (const { sample } of plan.transfers) if (!byId(shop.samples, sample)) faults.push(`unknown sample ${sample} travels`)
  for (const sample of shop.samples) {
    const stays = plan.entries.flatMap((entry) => {
      const step = byId(shop.steps, entry.step)
      const bench = byId(shop.benches, entry.bench)
      return step && bench && step.sample === sample.id && step.state !== 'done' ? [{ start: entry.start, end: entry.end, site: bench.site, step, leg: null }] : []
    })
    const rides = plan.transfers.filter((each) => each.sample === sample.id).map((leg) => ({ start: leg.depart, end: leg.arrive, site: leg.to, step: null, leg }))
    const events = [...stays, ...rides].sort((a, b) => a.start - b.start || a.end - b.end || (a.leg ? 1 : 0) - (b.leg ? 1 : 0))
    let site = sample.site
    let free = Math.max(shop.now, sample.availableFrom)
    for (const { start, end, site: to, step, leg } of events) {
      if (step?.state === 'started') {
        site = to
        free = Math.max(free, end)
        continue
      }
      if (start < free) faults.push(`sample ${sample.id} is still taken at ${start}`)
      if (step && to !== site) faults.push(`sample ${sample.id} is at ${site}, not at ${to}, at ${start}`)
      if (leg) {
        const lines = byId(shop.sites, leg.from)?.courier.filter((line) => line.to === leg.to && line.departures.includes(leg.depart) && leg.depart + line.minutes === leg.arrive) ?? []
        if (!lines.length) faults.push(`no courier from ${leg.from} to ${leg.to} at ${leg.depart}`)
        if (leg.from !== site) faults.push(`sample ${sample.id} leaves from ${leg.from} but is at ${site}`)
        if (leg.depart < shop.now) faults.push(`a courier with ${sample.id} leaves before now`)
      }
      free = Math.max(free, end)
      site = to
    }
    if (events.at(-1)?.leg) faults.push(`sample ${sample.id} travels without a later step`)
  }
  return faults
}
