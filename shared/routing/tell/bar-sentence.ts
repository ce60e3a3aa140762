import type { Bar } from '../layout/barred-from.ts'
import type { Step } from '../shop.ts'

/** Why a bench is ruled out for a step, for people. */
export function barSentence(bar: Bar, step: Step, bench: { id: string; site: string }): string {
  switch (bar.rule) {
    case 'kind': return `does not do ${step.kind}`
    case 'limit': return bar.low === null ? `states no limits for ${bar.need}, which the step needs` : `takes ${bar.need} ${bar.low} to ${bar.high}, not ${bar.value}`
    case 'scope': return `site ${bench.site} does not have ${bar.scope} in its scope`
    case 'pinned-bench': return `the step is pinned to ${bar.bench}`
    case 'out': return 'is out of use'
    case 'usable-until': return `is usable until minute ${bar.until} only`
    case 'nobody': return bar.person === null ? `nobody at site ${bench.site} may do ${step.kind}` : `${bar.person}, to whom the step is pinned, may not do ${step.kind} at site ${bench.site}`
    case 'authorised-until': return bar.person === null
      ? `the last authorisation for ${step.kind} at site ${bench.site} ends at minute ${bar.until}`
      : `the authorisation of ${bar.person} for ${step.kind} ends at minute ${bar.until}`
  }
}
