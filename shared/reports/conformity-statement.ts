import type { Result } from '../method/method.ts'
import { significant } from '../units/significant.ts'
import type { ReportContent } from './content.ts'
import { limitsOf, resultIn, together, type ResultColumn } from './results-table.ts'
import type { ReportedTest } from './reported.ts'
import { numberIn } from './words/number-in.ts'
import { sampleList } from './words/sample-list.ts'

const rules = {
  simple: 'simple acceptance: an unrounded result on or inside its limit meets it, without regard to its uncertainty; for a result at the limit the risk of a wrong decision is up to 50 %',
  guarded: 'guarded, guard band equal to the expanded uncertainty: a result inside its limit by that much or more meets it, one outside by more does not, and between the two it is undecided; the risk of wrong acceptance is below 2.5 % for each result',
} as const

/** Whether the limits that were ordered are met, by which rule, and what is not (ISO/IEC 17025:2017, 7.8.6). Null when nothing was limited. */
export function conformityStatement(tests: readonly ReportedTest[], columns: readonly ResultColumn[]): ReportContent['conformity'] {
  const judged = tests.filter(({ run }) => run?.evaluation.verdict)
  const outcome = together(judged.map(({ run }) => run?.evaluation.verdict?.outcome))
  if (!outcome) return null
  const ruled = (rule: keyof typeof rules) => judged.filter(({ run }) => run?.evaluation.verdict?.rule === rule)
  const used = (['simple', 'guarded'] as const).filter((rule) => ruled(rule).length > 0)
  const findings = columns.flatMap((column) => column.test.tests.flatMap((test) => finding(test, column)))
  return {
    outcome, findings,
    statement: outcome === 'pass' ? 'Every limit that was ordered is met.' : outcome === 'fail' ? 'Not every limit that was ordered is met.' : 'Every limit is met or undecided; none is broken.',
    rule: used.map((rule) => `Decision rule, as ordered${used.length > 1 ? ` for ${[...new Set(ruled(rule).map(({ label }) => label))].join(', ')}` : ''}: ${rules[rule]}.`).join(' '),
    limits: columns.flatMap((column) => { const limits = limitsOf(column); return limits.length > 1 ? [`${column.group}${column.group.includes(column.symbol) ? '' : `, ${column.symbol}`}: ${limits.map(({ text, samples }) => `${text} for ${sampleList(samples)}`).join('; ')}`] : [] }),
  }
}

function finding(test: ReportedTest, column: ResultColumn): string[] {
  const limit = test.run?.evaluation.verdict?.limits.find(({ key }) => key === column.result)
  const result = resultIn(test, column)
  if (!limit || limit.outcome === 'pass') return []
  const band = [limit.lower !== undefined && `at least ${limit.lower}`, limit.upper !== undefined && `at most ${limit.upper}`].filter(Boolean).join(' and ')
  const what = `Sample ${test.sample.split('-').at(-1)}, ${column.group}${column.group.includes(column.symbol) ? '' : `, ${column.symbol}`}`
  if (!result) return [`${what}: no result, undecided; ${band} was asked for.`]
  const why = limit.outcome === 'fail' ? 'does not meet its limit' : result.expandedUncertainty === undefined ? 'is undecided, since its uncertainty is not stated' : 'lies within its guard band and is undecided'
  return [`${what}: ${result.reported}${unrounded(result, limit)} ${why}; ${band} was asked for.`]
}

/** A result that is rounded onto its limit needs its further digits to be understood. */
function unrounded({ reported, value }: Result, { outcome, lower = -Infinity, upper = Infinity }: { outcome: string; lower?: number; upper?: number }): string {
  const printed = Number(numberIn(reported))
  return outcome === 'fail' && printed >= lower && printed <= upper ? ` (unrounded ${significant(value, 6)})` : ''
}
