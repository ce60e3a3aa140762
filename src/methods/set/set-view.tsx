import type { ReactNode } from 'react'
import { formFields } from '../../../shared/method/form.ts'
import { BigResult } from '../results/big-result.tsx'
import { BrokenRules } from '../results/broken-rules.tsx'
import { ConversionsBox } from '../results/conversions-box.tsx'
import { ResultFacts } from '../results/result-facts.tsx'
import { SheetColumns } from '../results/sheet-columns.tsx'
import { cellName } from '../pending-entries.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import type { GridColumn } from './grid-column.ts'
import { ReadingsGrid } from './readings-grid.tsx'
import { setRows } from './set-rows.ts'

/** Any method whose readings are rows of numbers: the grid, what it breaks, and the results. A method's own view adds to it. */
export function SetView({ sheet, rowName = 'Reading', columns = numberColumns(sheet), carry, more, picture, title, under, ticks, aside }: {
  sheet: SheetViewProps
  rowName?: string
  columns?: readonly GridColumn[]
  carry?: readonly string[]
  more?: Parameters<typeof ReadingsGrid>[0]['more']
  /** Beside the broken rules, under the grid. */
  picture?: ReactNode
  title?: ReactNode
  under?: ReactNode
  /** Readings of the result's own unit. */
  ticks?: readonly number[]
  aside?: ReactNode
}) {
  const { method, run, live, readings, typed } = sheet
  const count = Array.isArray(live.readings) ? live.readings.length : 0
  const rowKeys = keysInOrder(sheet, count)
  const refill = (key: string) => {
    const value: unknown = readings.find((reading) => reading.key === key)?.value
    const row: Record<string, unknown> = typeof value === 'object' && value !== null ? Object.fromEntries(Object.entries(value)) : {}
    return Object.fromEntries(columns.map(({ field }) => [cellName(field.name), typeof row[field.name] === 'number' ? String(row[field.name]) : (typed[cellName(field.name)] ?? '')]))
  }
  const bad = live.checks.flatMap(({ severity, reading }) => (severity === 'error' && reading !== undefined ? [reading] : []))
  const usual = `${nameOfMain(sheet)}, ${count} ${plural(rowName.toLowerCase(), count)}`
  return (
    <SheetColumns
      left={
        <>
          <ReadingsGrid columns={columns} rowName={rowName} sheet={sheet} carry={carry} more={more} />
          <div className={picture ? 'mt-6 grid grid-cols-[minmax(0,384px)_minmax(0,1fr)] items-start gap-7 max-tablet:grid-cols-1' : 'mt-6'}>
            {picture}
            <BrokenRules sheet={sheet} rowName={rowName.toLowerCase()} rowKeys={rowKeys} refill={refill} />
          </div>
        </>
      }
      result={<BigResult method={method} run={run} live={live} title={count === 0 ? nameOfMain(sheet) : (title ?? usual)} under={under} ticks={ticks} bad={bad} />}
      more={
        <>
          <div>
            <ResultFacts method={method} run={run} live={live} />
            {aside}
          </div>
          <ConversionsBox conversions={live.conversions} />
        </>
      }
    />
  )
}

/** Key of every row that counts, in the engine's order; the row being typed has none. */
export function keysInOrder({ readings }: Pick<SheetViewProps, 'readings'>, count: number): string[] {
  const counted = setRows(readings, false).filter((row) => row.counts).length
  const rows = setRows(readings, count > counted).filter((row) => row.counts)
  return Array.from({ length: count }, (_, place) => rows.find((row) => row.number === place + 1)?.reading.key ?? '')
}

/** A column for every number of the method's rows. */
export function numberColumns({ method }: Pick<SheetViewProps, 'method'>): GridColumn[] {
  return formFields(method.readings).flatMap((field) => (field.kind === 'number' ? [{ field, head: field.label, unit: field.unit }] : []))
}

function nameOfMain({ method }: SheetViewProps): string {
  return method.resultNames.find(({ key }) => key === method.mainResult)?.name ?? method.title
}

export function plural(word: string, count: number): string {
  return count === 1 ? word : `${word}s`
}
