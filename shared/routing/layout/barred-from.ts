import type { Bench, Step } from '../shop.ts'

/** A rule that keeps a step from a bench whatever the time. */
export type Bar =
  | { rule: 'kind' }
  | { rule: 'limit'; need: string; value: number; low: number | null; high: number | null }
  | { rule: 'scope'; scope: string }
  | { rule: 'out' }
  | { rule: 'pinned-bench'; bench: string }
  | { rule: 'usable-until'; until: number }
  | { rule: 'nobody'; person: string | null }
  | { rule: 'authorised-until'; until: number; person: string | null }

/**
 * The first rule that keeps `step` from `bench` at any time from `earliest` on, or null. `crew` has the ends of the authorisations of
 * those who could attend it there, null for a step that nobody attends.
 */
export function barredFrom(step: Step, bench: Bench, scope: string[], earliest: number, crew: number[] | null): Bar | null {
  const does = bench.does.filter(({ kind }) => kind === step.kind)
  if (!does.length) return { rule: 'kind' }
  const unmet = does.map(({ limits }) => unmetNeed(step, limits))
  if (unmet.every((bar) => bar !== null)) return unmet[0] ?? null
  if (step.scope !== null && !scope.includes(step.scope)) return { rule: 'scope', scope: step.scope }
  if (step.pin?.bench !== undefined && step.pin.bench !== bench.id) return { rule: 'pinned-bench', bench: step.pin.bench }
  if (bench.out) return { rule: 'out' }
  const end = Math.max(earliest, step.pin?.start ?? earliest) + step.setupMinutes + step.runMinutes
  if (end > bench.usableUntil) return { rule: 'usable-until', until: bench.usableUntil }
  if (!crew) return null
  const person = step.pin?.person ?? null
  if (!crew.length) return { rule: 'nobody', person }
  const until = crew.reduce((latest, each) => Math.max(latest, each), -Infinity)
  return end > until ? { rule: 'authorised-until', until, person } : null
}

function unmetNeed(step: Step, limits: Record<string, [number, number]>): Bar | null {
  for (const [need, value] of Object.entries(step.needs)) {
    const limit = Object.hasOwn(limits, need) ? limits[need] : undefined
    if (!limit) return { rule: 'limit', need, value, low: null, high: null }
    if (value < limit[0] || value > limit[1]) return { rule: 'limit', need, value, low: limit[0], high: limit[1] }
  }
  return null
}
