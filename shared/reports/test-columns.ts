import type { ReportedTest } from './reported.ts'

/** Tests of many samples that belong side by side: the same label, and the first, second… of it that its sample has. */
export type TestColumn = { key: string; label: string; tests: readonly ReportedTest[] }

/** Sorts tests into columns, in the order in which they first appear. */
export function testColumns(tests: readonly ReportedTest[]): TestColumn[] {
  const counts = new Map<string, number>()
  const columns = new Map<string, { label: string; tests: ReportedTest[] }>()
  for (const test of tests) {
    const own = `${test.sample} ${test.method.id} ${test.label}`
    const nth = (counts.get(own) ?? 0) + 1
    counts.set(own, nth)
    const key = `${test.method.id} ${test.label} ${nth}`
    const column = columns.get(key) ?? { label: nth === 1 ? test.label : `${test.label} (${nth})`, tests: [] }
    column.tests.push(test)
    columns.set(key, column)
  }
  return [...columns.values()].map(({ label, tests: own }, at) => ({ key: `t${at}`, label, tests: own }))
}
