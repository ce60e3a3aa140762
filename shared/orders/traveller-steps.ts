import type { StepKind, StepNeed } from '../method/method.ts'

/** A step of one sample, as it will stand on its traveller. `test` is the index of the test it serves; null when it serves several. */
export type TravellerStep = { type: StepKind; label: string; capability: string; test: number | null; need: StepNeed }

/**
 * The steps of one sample in order: the tests' needs one after the other, with sectioning done once for all of them, first, and as
 * long as the longest asks for.
 */
export function travellerSteps(tests: readonly { needs: readonly StepNeed[] }[]): TravellerStep[] {
  const all = tests.flatMap(({ needs }, test) => needs.map((need): TravellerStep => ({ type: need.kind, label: labelOf(need), capability: need.capability, test, need })))
  const cuts = all.filter(({ type }) => type === 'section')
  const rest = all.filter(({ type }) => type !== 'section')
  const [first, ...others] = cuts
  if (!first) return rest
  const need = others.reduce((so, { need: more }) => together(so, more), first.need)
  return [{ ...first, need, test: others.length > 0 ? null : first.test }, ...rest]
}

function labelOf({ kind, detail }: StepNeed): string {
  return detail ? `${kind} ${detail}` : kind
}

function together(one: StepNeed, other: StepNeed): StepNeed {
  const keys = [...new Set([...Object.keys(one.needs), ...Object.keys(other.needs)])]
  return {
    ...one,
    setupMinutes: Math.max(one.setupMinutes, other.setupMinutes),
    runMinutes: Math.max(one.runMinutes, other.runMinutes),
    attended: one.attended === 'all' || other.attended === 'all' ? 'all' : one.attended === 'setup' || other.attended === 'setup' ? 'setup' : 'none',
    needs: Object.fromEntries(keys.map((key) => [key, Math.max(one.needs[key] ?? -Infinity, other.needs[key] ?? -Infinity)])),
  }
}
