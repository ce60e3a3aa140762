import type { Bench, Person, Shop, Step } from '../shop.ts'
import { Couriers } from '../time/couriers.ts'
import { barredFrom } from './barred-from.ts'
import { orderSteps } from './order-steps.ts'

/** Where a step stands: bench and person by index, `[start, end)`. */
export type Placement = { bench: number; person: number | null; start: number; end: number }
/** A bench that may do a step and who may attend it there; `people` is null where nobody is needed. Ends are inclusive. */
export type Choice = { bench: number; until: number; people: { person: number; until: number }[] | null }

export type LaidStep = {
  step: Step
  sample: number
  job: number
  /** Set-up and run. */
  length: number
  /** How long it needs its person and how long it must lie inside open hours, from its start. */
  attendedLength: number
  openLength: number
  earliest: number
  before: number[]
  after: number[]
  /** A started or done step: stays as it is. */
  fixed: Placement | null
  choices: Choice[]
  /** The sites of its choices. */
  sites: number[]
}

/** A shop with its references resolved to indexes: read by every part of the planner, changed by none. */
export type Layout = {
  shop: Shop
  steps: LaidStep[]
  benchSites: number[]
  personSites: number[]
  sampleSites: number[]
  /** Step indexes, each after all that it waits for. */
  order: number[]
  /** For each sample its steps that are still to be placed, in that order. */
  bySample: number[][]
  couriers: Couriers
}

export function layOut(shop: Shop): Layout {
  const index = (list: { id: string }[]) => new Map(list.map(({ id }, i) => [id, i]))
  const [siteAt, benchAt, personAt, jobAt, sampleAt, stepAt] = [shop.sites, shop.benches, shop.people, shop.jobs, shop.samples, shop.steps].map(index)
  const of = (map: Map<string, number> | undefined, id: string) => map?.get(id) ?? -1

  const benchesByKind = new Map<string, number[]>()
  shop.benches.forEach((bench, i) => {
    for (const kind of new Set(bench.does.map((does) => does.kind))) benchesByKind.set(kind, [...(benchesByKind.get(kind) ?? []), i])
  })
  const crew = crews(shop.people)

  const steps = shop.steps.map((step): LaidStep => {
    const sample = of(sampleAt, step.sample)
    const { job, availableFrom } = shop.samples[sample]!
    const length = step.setupMinutes + step.runMinutes
    const earliest = Math.max(shop.now, availableFrom)
    const fixed = step.actual ? asPlacement(step, of(benchAt, step.actual.bench), step.actual.person === null ? null : of(personAt, step.actual.person), shop.now) : null
    const benches = fixed ? [] : (benchesByKind.get(step.kind) ?? [])
    const choices = benches.flatMap((bench): Choice[] => {
      const it = shop.benches[bench]!
      const people = crew(it, step)
      if (barredFrom(step, it, scopeOf(shop, of(siteAt, it.site)), earliest, people?.map(({ until }) => until) ?? null)) return []
      return [{ bench, until: Math.min(it.usableUntil, shop.horizon), people }]
    })
    return {
      step, sample, job: of(jobAt, job), length, earliest, fixed, choices, after: [],
      attendedLength: step.attended === 'all' ? length : step.attended === 'setup' ? step.setupMinutes : 0,
      openLength: Math.max(1, step.attended === 'all' ? length : step.attended === 'setup' ? step.setupMinutes : 1),
      before: [...new Set(step.after)].map((id) => of(stepAt, id)),
      sites: [...new Set(choices.map(({ bench }) => of(siteAt, shop.benches[bench]!.site)))],
    }
  })
  steps.forEach((step, i) => step.before.forEach((before) => steps[before]!.after.push(i)))

  const order = orderSteps(steps)
  const bySample: number[][] = shop.samples.map(() => [])
  for (const i of order) if (!steps[i]!.fixed) bySample[steps[i]!.sample]!.push(i)
  return {
    shop, steps, order, bySample,
    benchSites: shop.benches.map(({ site }) => of(siteAt, site)),
    personSites: shop.people.map(({ site }) => of(siteAt, site)),
    sampleSites: shop.samples.map(({ site }) => of(siteAt, site)),
    couriers: new Couriers(shop.sites, shop.now),
  }
}

const scopeOf = (shop: Shop, site: number) => shop.sites[site]?.scope ?? []

/** A started step is over at the later of now and its start with set-up and run. */
function asPlacement(step: Step, bench: number, person: number | null, now: number): Placement {
  const start = step.actual?.start ?? now
  return { bench, person, start, end: step.actual?.end ?? Math.max(now, start + step.setupMinutes + step.runMinutes) }
}

/** Who may attend a kind at a bench's site, and until when; null for a step that nobody attends. */
function crews(people: Person[]) {
  const known = new Map<string, { person: number; until: number }[]>()
  people.forEach(({ site, may }, person) => {
    for (const { kind, until } of may) {
      const key = JSON.stringify([site, kind])
      const crew = known.get(key) ?? []
      known.set(key, crew)
      const mine = crew.find((each) => each.person === person)
      if (mine) mine.until = Math.max(mine.until, until)
      else crew.push({ person, until })
    }
  })
  // Who may do few kinds comes first, so that those who may do many stay free.
  const breadth = people.map(({ may }) => new Set(may.map(({ kind }) => kind)).size)
  for (const crew of known.values()) crew.sort((a, b) => breadth[a.person]! - breadth[b.person]! || a.person - b.person)
  return (bench: Bench, step: Step) => {
    if (step.attended === 'none') return null
    const crew = known.get(JSON.stringify([bench.site, step.kind])) ?? []
    const pinned = step.pin?.person
    return pinned == null ? crew : crew.filter(({ person }) => people[person]!.id === pinned)
  }
}
