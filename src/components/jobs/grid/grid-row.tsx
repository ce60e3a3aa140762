import { memo } from 'react'
import type { OrderColumn } from '../../../../shared/api/orders.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { formatAmount } from '../../../lib/format.ts'
import { IconButton } from '../../ui/buttons/icon-button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { Menu } from '../../ui/feedback/menu.tsx'
import { Tick } from '../../ui/fields/tick.tsx'
import { cellNames, cellText, type CellName, type DraftRow } from '../draft/draft-state.ts'
import type { RowFault } from '../draft/row-faults.ts'
import { FaultNotes } from './fault-notes.tsx'

export type RowDeeds = {
  type: (id: string, cell: CellName, text: string) => void
  left: (id: string, cell: CellName) => void
  tick: (id: string, key: string, ticked: boolean) => void
  override: (id: string, key: string, parameters: Record<string, unknown> | null) => void
  correct: (id: string, cell: CellName) => void
  copy: (id: string) => void
  remove: (id: string) => void
}

const longest: Record<CellName, number> = { heat: 60, lot: 60, material: 100, form: 20, size: 40 }
const noFaults: readonly RowFault[] = []

/** One sample of the grid, and under it what has to be put right. `fresh` is the empty row below the last, which begins a sample when typed in. */
export const GridRow = memo(function GridRow({ row, place, fresh = false, columns, faults = noFaults, priceMinor, currency, chosen, deeds }: {
  row: DraftRow
  place: number
  fresh?: boolean
  columns: readonly OrderColumn[]
  faults?: readonly RowFault[] | undefined
  priceMinor?: number | undefined
  currency: string
  /** The column of the cells chosen together with this row's. */
  chosen: number | null
  deeds: RowDeeds
}) {
  const { id } = row
  const number = place + 1
  const why = `why-${id}`
  const cells = faults.map(({ cell, column }) => cell ?? (column ? null : 'tests'))
  return (
    <>
      <tr className={classNames('group', faults.length > 0 && 'wrong')} aria-label={fresh ? 'New sample' : `Sample ${number}`}>
        <td className="no">
          {fresh ? number : (
            <Menu
              label={`Row ${number}`} align="start"
              trigger={<button type="button" aria-label={`Row ${number}: copy or delete`} className="h-8.5 w-full text-right hover:text-ink hover:underline">{number}</button>}
              items={[{ label: 'Copy this row below', icon: 'plus', onSelect: () => deeds.copy(id) }, { label: 'Delete this row', icon: 'cross', danger: true, onSelect: () => deeds.remove(id) }]}
            />
          )}
        </td>
        {cellNames.map((cell, column) => {
          const isBad = cells.includes(cell)
          const text = cellText(row, cell)
          return (
            <td key={cell} data-row={place} data-column={column} className={classNames(cell === 'size' && 'num', isBad && 'bad', chosen === column && 'together')}>
              <input
                id={`cell-${id}-${cell}`} value={fresh ? '' : text} placeholder={fresh && cell !== 'heat' && cell !== 'lot' ? text : undefined} maxLength={longest[cell]} autoComplete="off" spellCheck={false}
                aria-label={`${cell}, ${fresh ? 'new row' : `row ${number}`}`} aria-invalid={isBad || undefined} aria-describedby={isBad ? why : undefined}
                className={classNames((cell === 'heat' || cell === 'lot') && 'mono', cell === 'size' && 'text-right')} {...(cell === 'form' && { list: 'product-forms' })}
                onChange={(event) => deeds.type(id, cell, event.target.value)} onBlur={() => !fresh && deeds.left(id, cell)}
              />
            </td>
          )
        })}
        {columns.map((column, at) => {
          const ticked = !fresh && row.sample.tests.includes(column.key)
          const isBad = faults.some((fault) => fault.column === column.key)
          const own = ticked ? row.sample.overrides[column.key] : undefined
          const { label } = orderedTest(column, own)
          return (
            <td key={column.key} data-row={place} data-column={cellNames.length + at} className={classNames('tk', at === 0 && 'first', chosen === cellNames.length + at && 'together')}>
              <span className="inline-flex items-center gap-1">
                <Tick label={`${orderedTest(column).label}, ${fresh ? 'new row' : `row ${number}`}`} labelHidden checked={ticked} aria-invalid={isBad || (cells.includes('tests') && !fresh) || undefined} onChange={(event) => deeds.tick(id, column.key, event.target.checked)} />
                {own && <IconButton icon="pen" label={`Row ${number} has its own: ${label}. Press to take the column’s`} className="size-6!" onClick={() => deeds.override(id, column.key, null)} />}
              </span>
            </td>
          )
        })}
        <td className="tk" />
        <td className="num">{priceMinor !== undefined && formatAmount(priceMinor, currency)}</td>
      </tr>
      {faults.length > 0 && (
        <tr className="why">
          <td />
          <td colSpan={cellNames.length + columns.length + 2}>
            <FaultNotes
              id={why} faults={faults} columns={columns}
              cure={{ override: (key, parameters) => deeds.override(id, key, parameters), untick: (key) => deeds.tick(id, key, false), correct: (cell) => deeds.correct(id, cell) }}
            />
          </td>
        </tr>
      )}
    </>
  )
})
