import type { ReportContent } from './content.ts'
import { sampleList } from './words/sample-list.ts'
import type { ReportedTest } from './reported.ts'
import type { TestColumn } from './test-columns.ts'

/** Most lines that are written out for single samples before they are put together. */
const mostSeparate = 6

/** How each way of testing was done: lines that hold for all its samples, then those that hold for some, with their names. */
export function methodsUsed(columns: readonly TestColumn[]): ReportContent['methods'] {
  return columns.flatMap(({ label, tests }) => {
    const ran = tests.flatMap((test) => (test.run ? [{ test, lines: linesOf(test) }] : []))
    const [first] = ran
    if (!first) return []
    const shared = first.lines.filter((line) => ran.every(({ lines }) => lines.includes(line)))
    const own = new Map<string, string[]>()
    for (const { test, lines } of ran) for (const line of lines.filter((one) => !shared.includes(one))) own.set(line, [...(own.get(line) ?? []), test.sample])
    const separate = [...own]
    const lines = [...shared, ...(separate.length <= mostSeparate ? separate.map(([line, samples]) => `${capital(sampleList(samples))}: ${line}`) : ['What differs from sample to sample stands with the readings.'])]
    const standards = [...new Set(ran.flatMap(({ test }) => test.run?.evaluation.results.map(({ basis }) => basis) ?? []))]
    const equipment = [...new Set(ran.flatMap(({ test }) => test.run?.equipment ?? []))].sort()
    return [{ label, standards, lines, equipment, samples: [] }]
  })
}

/** Lines of the method; those that merely repeat readings stand in their own table. */
export function linesOf({ method, run }: ReportedTest): string[] {
  return run ? method.report({ ...run.input, results: run.evaluation.results }).filter((line) => !/^readings? /i.test(line)) : []
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)
