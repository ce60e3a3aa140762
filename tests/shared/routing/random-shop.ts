import fc from 'fast-check'
import type { Shop } from '../../../shared/routing/shop.ts'

const kinds = ['cut', 'polish', 'etch', 'measure', 'pull']

/** Shops of every shape that the contract allows: several sites and couriers, closed hours, pins, started, done and frozen steps, impossible steps. */
export const randomShop: fc.Arbitrary<Shop> = fc.gen().map((generate): Shop => {
  const int = (min: number, max: number) => generate(() => fc.noBias(fc.integer({ min, max })))
  const flag = (percent: number) => int(1, 100) <= percent
  const one = <T>(list: readonly T[]): T => list[int(0, list.length - 1)]!
  const some = <T>(list: readonly T[], percent: number): T[] => list.filter(() => flag(percent))

  const now = one([0, 480, 500, -60])
  const horizon = now + one([600, 2880, 6000, 8000, 8000])
  const hours = (): [number, number][] => {
    if (flag(15)) return [[now - 600, horizon + 600]]
    const days = [0, 1, 2, 3, 4].filter(() => !flag(10))
    return days.flatMap((day): [number, number][] => {
      const from = day * 1440 + one([420, 480, 510])
      const to = from + one([300, 540, 620])
      return flag(30) ? [[from, from + 240], [from + 270, to + 60]] : [[from, to]]
    })
  }
  const limits = (): Record<string, [number, number]> => (flag(75) ? { forceKn: [0, one([60, 100, 600])] } : {})
  const names = ['T', 'O', 'W'].slice(0, int(1, 3))
  const sites = names.map((id) => ({
    id, scope: some(['tensile', 'hardness'], 70),
    courier: names.filter((to) => to !== id && flag(80)).map((to) => ({ to, departures: some([300, 600, 840, 960, 1800, 2400, 3300, 3900], 60), minutes: one([5, 30, 75, 120]) })),
  }))
  const benches = Array.from({ length: int(2, 8) }, (_, i) => ({
    id: `B${i}`, site: one(names), units: one([1, 1, 1, 2, 4]), open: hours(),
    does: Array.from({ length: int(2, 4) }, () => ({ kind: one(kinds), limits: limits() })),
    usableUntil: flag(12) ? now + int(0, 2500) : horizon + 1000, out: flag(5),
  }))
  const people = Array.from({ length: one([0, 2, 3, 4, 6]) }, (_, i) => ({
    id: `P${i}`, site: one(names), open: hours(),
    may: some(kinds, 85).map((kind) => ({ kind, until: flag(8) ? now + int(0, 2500) : horizon + 1000 })),
  }))
  const jobs = Array.from({ length: int(1, 4) }, (_, i) => ({ id: `J${i}`, due: now + int(-100, 3000), weight: one([0, 1, 2.5, 10]) }))
  const samples = Array.from({ length: int(1, 7) }, (_, i) => ({ id: `S${i}`, job: one(jobs).id, site: one(names), availableFrom: flag(70) ? now - 100 : now + int(0, 1500) }))

  const steps: Shop['steps'] = []
  const holder = new Set<string>()
  for (const sample of samples) {
    const mine: string[] = []
    for (let count = int(0, 5); count > 0; count--) {
      const attended = one(['all', 'all', 'setup', 'none'] as const)
      const id = `${sample.id}.${mine.length}`
      const before = mine.at(-1)
      const kind = one(flag(95) ? benches.flatMap(({ does }) => does.map((each) => each.kind)) : kinds)
      const able = benches.filter(({ does }) => does.some((each) => each.kind === kind))
      const bench = () => one(able.length && flag(85) ? able : benches).id
      const step: Shop['steps'][number] = {
        id, sample: sample.id, kind,
        after: [...(before && flag(80) ? [before] : []), ...(steps.length && flag(15) ? [one(steps).id] : [])],
        setupMinutes: attended === 'setup' ? int(1, 30) : one([0, 10, 15]), runMinutes: flag(5) ? 0 : int(1, 300),
        attended, needs: flag(30) ? { forceKn: one([5, 50, 50, 500]) } : {}, scope: flag(8) ? one(['tensile', 'hardness']) : null,
      }
      const person = people.length && attended !== 'none' ? one(people).id : null
      const started = !holder.has(sample.id) && (attended === 'none' || person !== null)
      if (started && !mine.length && flag(15)) {
        const done = flag(50)
        step.state = done ? 'done' : 'started'
        step.actual = { bench: bench(), person, start: now - int(50, 200), ...(done ? { end: now - int(0, 50) } : {}) }
        if (!done) holder.add(sample.id)
      } else if (flag(8)) {
        step.pin = { ...(flag(50) ? { bench: bench() } : {}), ...(flag(40) && person ? { person } : {}), ...(flag(40) ? { start: now + int(-50, 2000) } : {}) }
      }
      if (flag(25)) step.previous = { bench: flag(90) ? bench() : 'gone', person: flag(90) ? person : null, start: now + int(-50, 600) }
      mine.push(id)
      steps.push(step)
    }
  }
  return { now, frozenMinutes: one([0, 240, 600]), horizon, effort: 200, sites, benches, people, jobs, samples, steps }
})
