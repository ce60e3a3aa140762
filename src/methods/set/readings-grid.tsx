import { useId, useRef, type KeyboardEvent, type ReactNode } from 'react'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import { Icon } from '../../components/ui/icon.tsx'
import { Kbd } from '../../components/ui/kbd.tsx'
import { classNames } from '../../components/ui/class-names.ts'
import { useKeys } from '../../components/ui/buttons/use-keys.ts'
import { cellName, typedRow } from '../pending-entries.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { GridCell } from './grid-cell.tsx'
import type { GridColumn } from './grid-column.ts'
import { GridRow } from './grid-row.tsx'
import { nextRow, setRows } from './set-rows.ts'

/**
 * Rows of numbers at the bench: kept ones above and below, the one being typed as a row of fields. Enter keeps it and goes on, ↑ ↓ go
 * through the rows, S strikes out the row one stands on, or from the typing row the one that breaks a rule.
 */
export function ReadingsGrid({ columns, rowName, sheet, carry = [], more }: {
  columns: readonly GridColumn[]
  /** "Reading", "Field" */
  rowName: string
  sheet: SheetViewProps
  /** Columns that start with what the row before had. */
  carry?: readonly string[]
  /** Further cells of a kept row, after its columns: worked out, not typed. */
  more?: { head: ReactNode; unit?: string; cell: (value: Record<string, unknown>) => ReactNode }[]
}) {
  const { method, readings, live, typed, type, keep, strike, locked } = sheet
  const body = useRef<HTMLTableSectionElement>(null)
  const problemId = useId()
  const next = nextRow(readings)
  const path = `readings.${next}`
  const before = readings.findLast(({ struck, path: other }) => !struck && other.startsWith('readings.'))
  const carried = Object.fromEntries(carry.flatMap((name) => {
    const value = valueOf(before?.value)[name]
    return (typed[cellName(name)] ?? '') === '' && typeof value === 'number' ? [[name, value]] : []
  }))
  const value = { ...carried, ...typedRow(method, typed) }
  const began = columns.some(({ field }) => (typed[cellName(field.name)] ?? '') !== '')
  const problem = began ? checkEntry(method, path, value) : null
  const rows = setRows(readings, began && problem === null)
  const at = rows.filter(({ index, counts }) => index < next && counts).length
  const gap = rows.some(({ index, counts }) => counts && index > next)

  const focusTyping = () => body.current?.querySelector<HTMLInputElement>('[data-typing] input')?.focus()
  const keepRow = () => {
    const missing = columns.find(({ field }) => !field.optional && value[field.name] === undefined)
    if (missing || problem !== null || locked) {
      body.current?.querySelector<HTMLInputElement>(`[data-typing] input[name="${missing?.field.name ?? columns[0]?.field.name ?? ''}"]`)?.focus()
      return
    }
    keep([{ path, value }])
    type(Object.fromEntries(columns.map(({ field }) => [cellName(field.name), ''])))
    setTimeout(focusTyping)
  }
  const keys = (event: KeyboardEvent<HTMLTableSectionElement>) => {
    if (event.ctrlKey || event.metaKey) return // Ctrl Enter records the run from here too
    const all = [...(body.current?.querySelectorAll<HTMLElement>('tr[data-row], tr[data-typing]') ?? [])]
    const here = all.findIndex((row) => row.contains(document.activeElement))
    if (event.key === 'Enter' && all[here]?.dataset['typing'] !== undefined) {
      event.preventDefault()
      keepRow()
    } else if (event.key === 'ArrowUp' || event.key === 'ArrowDown') {
      const target = all[here + (event.key === 'ArrowUp' ? -1 : 1)]
      if (!target) return
      event.preventDefault()
      if (target.dataset['typing'] !== undefined) focusTyping()
      else target.focus()
    } else if (event.key === 'Escape' && all[here]?.dataset['row'] !== undefined) focusTyping()
  }
  useKeys({
    s: () => {
      const focused = document.activeElement?.closest<HTMLElement>('tr[data-row]')?.dataset['row']
      const broken = live.checks.findLast(({ severity, reading }) => severity === 'error' && reading !== undefined)?.reading
      const key = focused ?? rows.find((row) => row.counts && row.number - 1 === broken)?.reading.key ?? rows.findLast((row) => row.counts)?.reading.key
      if (key && !locked) strike(key)
    },
  })

  const typing = (
    <tr key="typing" data-typing="" className="text-17">
      <th scope="row" className="h-12.5 w-16 border-b border-line pr-3 text-left font-normal text-quiet">{gap && !(began && problem === null) ? '' : at + 1}</th>
      {columns.map(({ field }, place) => (
        <GridCell
          key={field.name} field={field} isMain={place === 0} label={`${rowName} ${at + 1}, ${field.label.toLowerCase()}`} text={typed[cellName(field.name)] || (carried[field.name] === undefined ? '' : String(carried[field.name]))}
          isCarried={carried[field.name] !== undefined} onText={(text) => type({ [cellName(field.name)]: text })} readOnly={Boolean(locked)} describedBy={problem ? problemId : undefined} autoFocus={place === 0}
        />
      ))}
      {more?.map((_, place) => <td key={place} className="border-b border-line" />)}
      <td className="h-12.5 border-b border-line px-3 text-15 text-quiet">
        {locked ? null : problem ? <span id={problemId} className="text-red">{problem}</span> : began ? <span className="whitespace-nowrap"><Kbd>Enter</Kbd> keeps it</span> : null}
      </td>
    </tr>
  )
  const cells = rows.map((row) => (
    <GridRow key={row.reading.key} row={row} rowName={rowName} columns={columns} more={more} checks={live.checks.filter(({ reading }) => row.counts && reading === row.number - 1)} locked={locked} settle={sheet.settle} onStrike={() => strike(row.reading.key)} nextPath={path} />
  ))
  const place = rows.filter(({ index }) => index <= next).length
  return (
    <table className="w-full border-collapse" aria-label={`${rowName}s`}>
      <thead>
        <tr className="text-13">
          <th scope="col" className="w-16 border-b border-ink pr-3 pb-1.5 text-left font-medium">{rowName}</th>
          {columns.map(({ field, head, unit }, at) => <th key={field.name} scope="col" className={classNames('border-b border-ink px-3 pb-1.5 font-medium', at === 0 ? 'text-left' : 'text-right')}>{head} {unit && <span className="unit">{unit}</span>}</th>)}
          {more?.map(({ head, unit }, at) => <th key={at} scope="col" className="w-22 border-b border-ink px-3 pb-1.5 text-right font-medium">{head} {unit && <span className="unit">{unit}</span>}</th>)}
          <th scope="col" className="border-b border-ink pb-1.5"><span className="sr-only">What is to be said about it</span></th>
        </tr>
      </thead>
      <tbody ref={body} onKeyDown={keys}>
        {locked ? cells : [...cells.slice(0, place), typing, ...cells.slice(place)]}
        {locked && rows.length === 0 && <tr><td colSpan={columns.length + 2} className="py-4 text-quiet"><Icon name="info" className="mr-2 inline" />No readings were kept.</td></tr>}
      </tbody>
    </table>
  )
}

function valueOf(value: unknown): Record<string, unknown> {
  return typeof value === 'object' && value !== null ? Object.fromEntries(Object.entries(value)) : {}
}
