import type { TestRun } from '../../shared/api/test-runs.ts'
import { evaluate, isRefused } from '../../shared/evaluate.ts'
import { inputOf, type Entry } from '../../shared/method/entries.ts'
import type { Evaluation, Method } from '../../shared/method/method.ts'
import type { Live } from './sheet-view.ts'

/** The same answer as the server's when the run is recorded, from what stands on the sheet now. */
export function evaluateLive(method: Method, { parameters, requirement }: Pick<TestRun, 'parameters' | 'requirement'>, entries: readonly Entry[]): Live {
  const input = inputOf(parameters, entries, method.isSet)
  const nothing = { ...input, results: [], checks: [], verdict: undefined, conversions: [] }
  if (entries.length === 0) return { ...nothing, failure: '' }
  const answer = evaluate({ method: method.id, ...input, ...(requirement && requirement.limits.length > 0 && { requirement }) })
  if (isRefused(answer)) {
    const said = answer.error.issues.map(({ path, message }) => (path.length > 0 ? `${path.join(' ')} ${message}` : message))
    return { ...nothing, failure: [...new Set(said)].slice(0, 3).join('; ') }
  }
  const { results, checks, verdict } = answer as Evaluation
  return { ...input, results, checks, verdict, failure: '', conversions: results.length > 0 ? (method.conversions?.({ parameters: input.parameters, results }) ?? []) : [] }
}
