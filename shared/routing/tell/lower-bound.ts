import type { Layout } from '../layout/layout.ts'
import { firstInside } from '../time/first-inside.ts'

/**
 * A bound that no plan's weighted tardiness is below. Every job is planned as if it had the network to itself: its steps in order, in open
 * hours of bench and person, with couriers, but with nothing taken by others. The work on one sample is also one after the other. What
 * cannot be done at all finishes at the horizon. Unit: weight x minutes.
 */
export function lowerBound(layout: Layout): number {
  const { shop, steps, order, benchSites, sampleSites, couriers } = layout
  /** For each step its earliest end at each site where it can be done. */
  const ends = steps.map(() => new Map<number, number>())
  const held = new Set(steps.flatMap(({ step, sample }) => (step.state === 'started' ? [sample] : [])))
  const soonest = new Float64Array(steps.length)
  for (const i of order) {
    const { fixed, before, earliest, choices, sample, length, step } = steps[i]!
    if (fixed) {
      ends[i]!.set(benchSites[fixed.bench]!, fixed.end)
      soonest[i] = fixed.end
      continue
    }
    const ready = before.reduce((time, each) => Math.max(time, soonest[each]!), earliest)
    const sameSample = before.filter((each) => steps[each]!.sample === sample && steps[each]!.step.state !== 'done')
    soonest[i] = shop.horizon
    if (ready + length > shop.horizon) continue
    for (const choice of choices) {
      const site = benchSites[choice.bench]!
      // A step of the same sample tells where it comes from; else it comes from where it lies, unless a started step holds it elsewhere.
      const arrivals = sameSample.map((each) => [...ends[each]!].reduce((time, [from, end]) => Math.min(time, couriers.arrival(from, site, end)), Infinity))
      const arrive = sameSample.length ? Math.max(...arrivals) : held.has(sample) ? ready : couriers.arrival(sampleSites[sample]!, site, earliest)
      const start = firstOpen(layout, i, choice.bench, choice.people?.map(({ person }) => person) ?? null, Math.max(ready, arrive))
      const at = step.pin?.start === undefined ? start : start <= step.pin.start ? step.pin.start : Infinity
      if (at + length > shop.horizon) continue
      ends[i]!.set(site, Math.min(ends[i]!.get(site) ?? Infinity, at + length))
      soonest[i] = Math.min(soonest[i], at + length)
    }
  }
  const finish = shop.jobs.map(() => -Infinity)
  steps.forEach(({ job }, i) => (finish[job] = Math.max(finish[job]!, soonest[i]!)))
  layout.bySample.forEach((mine) => {
    const first = steps[mine[0] ?? -1]
    if (!first) return
    const work = mine.reduce((sum, i) => sum + steps[i]!.length, first.earliest)
    finish[first.job] = Math.max(finish[first.job]!, Math.min(shop.horizon, work))
  })
  return shop.jobs.reduce((sum, { due, weight }, i) => sum + weight * Math.max(0, finish[i]! - due), 0)
}

/** The earliest start in open hours of a bench and of one of the people, whatever else they do. */
function firstOpen({ shop, steps }: Layout, i: number, bench: number, people: number[] | null, from: number): number {
  const { openLength, attendedLength } = steps[i]!
  const open = shop.benches[bench]!.open
  if (!people) return firstInside(open, from, openLength)
  let best = Infinity
  for (const person of people) {
    let start = from
    for (let before = -Infinity; before !== start && start < best; ) {
      before = start
      start = firstInside(shop.people[person]!.open, firstInside(open, start, openLength), Math.max(1, attendedLength))
    }
    best = Math.min(best, start)
  }
  return best
}
