import { conformity } from '../statistics/conformity.ts'
import type { Outcome, Requirement, Result, Verdict } from './method.ts'

/**
 * Holds results against a requirement, limit by limit, by unrounded value (ASTM E29, absolute method; ILAC-G8:09/2019). A limit on a result that the
 * readings did not give is undecided, and so is a guarded limit on a result without an expanded uncertainty. The whole fails when
 * one limit fails, and passes only when every one passes.
 */
export function verdict(requirement: Requirement, results: readonly Result[]): Verdict {
  const limits = requirement.limits.map(({ key, lower, upper }): Verdict['limits'][number] => {
    const result = results.find((one) => one.key === key)
    const stated = { key, ...(lower !== undefined && { lower }), ...(upper !== undefined && { upper }) }
    if (!result) return { ...stated, outcome: 'undecided' }
    const { value, expandedUncertainty, coverageFactor } = result
    const { outcome, probabilityOfConformity } = conformity({ value, expandedUncertainty, coverageFactor, lower, upper, rule: requirement.rule })
    return { ...stated, outcome, ...(probabilityOfConformity !== undefined && { probabilityOfConformity }) }
  })
  return { outcome: together(limits.map((limit) => limit.outcome)), rule: requirement.rule, limits }
}

function together(outcomes: readonly Outcome[]): Outcome {
  if (outcomes.includes('fail')) return 'fail'
  return outcomes.includes('undecided') ? 'undecided' : 'pass'
}
