import type { ReportContent } from './content.ts'
import { numberIn } from './words/number-in.ts'
import { resultIn, type ResultColumn } from './results-table.ts'
import type { TestColumn } from './test-columns.ts'

/** What the tests gave besides the results table: one table for each way of testing, a row for each sample. */
export function furtherResults(tests: readonly TestColumn[], shown: readonly ResultColumn[]): ReportContent['further'] {
  return tests.flatMap(({ key, label, tests: own }) => {
    const ran = own.filter(({ run }) => run)
    const inTable = shown.filter(({ test }) => test.key === key)
    const left = ran.flatMap((test) => (test.run?.evaluation.results ?? []).filter((result) => !inTable.some((column) => column.result === result.key && resultIn(test, column) === result)))
    const names = new Map(own[0]?.method.resultNames.map(({ key: name, name: text }, at) => [name, { text, at }]) ?? [])
    const columns = [...new Map(left.map(({ key: name, symbol, unit }) => [JSON.stringify([name, symbol, unit]), { key: name, symbol, unit, name: names.get(name)?.text ?? symbol }])).values()]
      .sort((a, b) => (names.get(a.key)?.at ?? 0) - (names.get(b.key)?.at ?? 0))
    if (columns.length === 0) return []
    const rows = ran.map(({ sample, run }) => ({
      sample, cells: columns.map((column) => { const found = run?.evaluation.results.find((one) => one.key === column.key && one.symbol === column.symbol && one.unit === column.unit); return found ? numberIn(found.reported) : '' }),
    }))
    return [{ label, columns: columns.map(({ symbol, unit, name }) => ({ symbol, unit, name: name.charAt(0).toUpperCase() + name.slice(1) })), rows }]
  })
}
