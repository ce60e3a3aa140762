import type { Outcome, Result, ResultName } from '../method/method.ts'
import { decimalsOf, round } from '../units/round.ts'
import { significant } from '../units/significant.ts'
import type { ReportContent } from './content.ts'
import { numberIn } from './words/number-in.ts'
import type { ReportedTest } from './reported.ts'
import type { TestColumn } from './test-columns.ts'

type Columns = ReportContent['columns']
type Row = ReportContent['rows'][number]
export type ResultsTable = Pick<ReportContent, 'columns' | 'rows' | 'limits' | 'uncertainties' | 'coverage'>
/** One column of the table: one result of one way of testing. */
export type ResultColumn = Columns[number] & { test: TestColumn; result: string; decimals: number }

/** Results that every trade paper of this kind shows side by side; what else a test gave has tables of its own. */
const shownByName = new Set(['mean', 'proofStrength', 'upperYield', 'lowerYield', 'tensileStrength', 'elongation', 'reductionOfArea', 'grainSize'])

/** The columns of the results table: main results, those with limits, and the usual ones, each with its own symbol and unit. */
export function resultColumns(tests: readonly TestColumn[]): ResultColumn[] {
  return tests.flatMap((test) => {
    const method = test.tests[0]?.method
    if (!method) return []
    return method.resultNames.filter((name) => isShown(test, name)).flatMap((name) => {
      const found = results(test).filter(({ key }) => key === name.key)
      const kinds = found.length > 0 ? distinct(found.map(({ symbol, unit }) => JSON.stringify([symbol, unit]))) : [JSON.stringify([name.symbol, name.unit])]
      return kinds.map((kind, at): ResultColumn => {
        const [symbol, unit] = JSON.parse(kind) as [string, string]
        const unitIsName = unit === '' || unit === symbol
        return { key: `${test.key}.${name.key}${at > 0 ? `.${at}` : ''}`, group: test.label, head: unitIsName ? capital(name.name) : symbol, symbol, unit: unitIsName ? symbol : unit, name: capital(name.name), test, result: name.key, decimals: name.decimals }
      })
    })
  })
}

function isShown(test: TestColumn, { key }: ResultName): boolean {
  const limited = test.tests.some(({ requirement, run }) => run && requirement?.limits.some((limit) => limit.key === key))
  const measured = results(test).some((result) => result.key === key)
  return limited || (measured && (shownByName.has(key) || test.tests[0]?.method.mainResult === key))
}

/** A row for each sample with what was reported, and under the columns what holds for all rows. */
export function resultsTable(columns: readonly ResultColumn[], samples: readonly string[]): ResultsTable {
  const rows = samples.map((sample) => rowOf(sample, columns))
  const uncertainties = columns.flatMap((column) => uncertaintyOf(column, rows))
  const factors = distinct(columns.flatMap(({ test, result }) => results(test).filter(({ key, coverageFactor }) => key === result && coverageFactor !== undefined).map(({ coverageFactor }) => plain(coverageFactor!))))
  return {
    columns: columns.map(({ key, group, head, symbol, unit, name }) => ({ key, group, head, symbol, unit, name })), rows,
    limits: Object.fromEntries(columns.flatMap((column) => { const [limit, ...others] = limitsOf(column); return limit && others.length === 0 ? [[column.key, limit.text]] : [] })),
    uncertainties: Object.fromEntries(uncertainties), coverage: factors.length === 0 ? '' : factors.length === 1 ? `k = ${factors[0]}` : '95.45 %',
  }
}

function rowOf(sample: string, columns: readonly ResultColumn[]): Row {
  const row: Row = { sample, outcome: null, cells: {}, missing: {} }
  for (const column of columns) {
    const test = column.test.tests.find((one) => one.sample === sample)
    const result = test && resultIn(test, column)
    const outcome = test?.run?.evaluation.verdict?.limits.find(({ key }) => key === column.result)?.outcome ?? null
    if (result) row.cells[column.key] = { reported: result.reported, number: numberIn(result.reported), uncertainty: result.expandedUncertainty ?? null, outcome }
    else row.missing[column.key] = !test ? 'not ordered' : test.run ? 'no result' : 'not tested'
  }
  const outcomes = columns.flatMap((column) => column.test.tests.filter((test) => test.sample === sample).map(({ run }) => run?.evaluation.verdict?.outcome))
  return { ...row, outcome: together(outcomes) }
}

/** Fails when one fails, passes when every verdict there is passes; null without any. */
export function together(outcomes: readonly (Outcome | undefined)[]): Outcome | null {
  const given = outcomes.filter((outcome) => outcome !== undefined)
  if (given.length === 0) return null
  return given.includes('fail') ? 'fail' : given.includes('undecided') ? 'undecided' : 'pass'
}

export function resultIn({ run }: ReportedTest, { result, symbol, unit }: ResultColumn): Result | undefined {
  return run?.evaluation.results.find((one) => one.key === result && one.symbol === symbol && (one.unit === unit || one.unit === '' || one.unit === symbol))
}

/** The different limits on a column, each with the samples that it holds for. */
export function limitsOf({ test, result, decimals }: ResultColumn): { text: string; samples: string[] }[] {
  const texts = new Map<string, string[]>()
  for (const { sample, requirement, run } of test.tests) {
    const limit = run && requirement?.limits.find(({ key }) => key === result)
    const text = limit ? limitText(limit, decimals) : ''
    if (run) texts.set(text, [...(texts.get(text) ?? []), sample])
  }
  if ([...texts.keys()].every((text) => text === '')) return []
  return [...texts].map(([text, samples]) => ({ text: text || 'no limit', samples }))
}

function limitText({ lower, upper }: { lower?: number; upper?: number }, decimals: number): string {
  const write = (value: number) => value.toFixed(Math.max(decimals, decimalsOf(plain(value))))
  if (lower !== undefined && upper !== undefined) return lower === upper ? write(lower) : `${write(lower)} to ${write(upper)}`
  return lower !== undefined ? `≥ ${write(lower)}` : upper !== undefined ? `≤ ${write(upper)}` : ''
}

/** The expanded uncertainty of a column: one figure where all samples have the same, else from the least to the largest. */
function uncertaintyOf({ key, decimals }: ResultColumn, rows: readonly Row[]): [string, string][] {
  const values = rows.flatMap(({ cells }) => cells[key]?.uncertainty ?? [])
  if (values.length === 0) return []
  const write = (value: number) => { const text = round(value, decimals > 0 ? `0.${'0'.repeat(decimals - 1)}1` : '1'); return Number(text) > 0 ? text : significant(value, 1) }
  const [least, largest] = [write(Math.min(...values)), write(Math.max(...values))]
  return [[key, least === largest ? least : `${least} to ${largest}`]]
}

const results = ({ tests }: TestColumn): Result[] => tests.flatMap(({ run }) => run?.evaluation.results ?? [])
const distinct = <T>(values: readonly T[]): T[] => [...new Set(values)]
const plain = (value: number) => String(Number(value.toPrecision(10)))
const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1)
