import { useRef, type KeyboardEvent, type ReactNode } from 'react'
import type { Field, TableField } from '../../../../shared/method/field.ts'
import { Button } from '../buttons/button.tsx'
import { IconButton } from '../buttons/icon-button.tsx'
import { FieldError } from '../fields/field.tsx'
import { ScrollSideways } from '../table/scroll-sideways.tsx'
import type { Values } from './field-value.ts'

/** Rows of the same columns. ↑ and ↓ go to the row above and below, Enter in the last row adds one. `draw` draws one cell. */
export function RowsInput({ field, rows, onRows, newRow, draw, problem, readOnly }: {
  field: TableField
  rows: readonly Values[]
  onRows: (rows: readonly Values[]) => void
  newRow: () => Values
  draw: (column: Field, row: Values, place: number, set: (row: Values) => void) => ReactNode
  problem: string | undefined
  readOnly: boolean
}) {
  const body = useRef<HTMLTableSectionElement>(null)
  const most = field.most ?? 1000
  const go = (row: number, column: number) => setTimeout(() => body.current?.rows[row]?.cells[column]?.querySelector<HTMLElement>('input, select')?.focus())
  const add = () => {
    onRows([...rows, newRow()])
    go(rows.length, 1)
  }
  const move = (place: number, column: number) => (event: KeyboardEvent) => {
    if (event.target instanceof HTMLSelectElement && event.key !== 'Enter') return
    if (event.key === 'ArrowUp' && place > 0) go(place - 1, column)
    else if (event.key === 'ArrowDown' && place < rows.length - 1) go(place + 1, column)
    else if (event.key === 'Enter' && place < rows.length - 1) go(place + 1, column)
    else if (event.key === 'Enter' && !readOnly && rows.length < most) add()
    else return
    event.preventDefault()
  }
  return (
    <fieldset className="col-span-full min-w-0">
      <legend className="mb-1 text-13 font-medium">{field.label}</legend>
      {rows.length > 0 && (
        <ScrollSideways label={field.label}>
          <table className="table" aria-label={field.label}>
            <thead>
              <tr>
                <th scope="col" className="w-8"><span className="sr-only">Row</span></th>
                {field.columns.map((column) => <th key={column.name} scope="col">{column.label}{'unit' in column && column.unit && <span className="unit">, {column.unit}</span>}</th>)}
                {!readOnly && <th scope="col" className="w-9"><span className="sr-only">Remove</span></th>}
              </tr>
            </thead>
            <tbody ref={body}>
              {rows.map((row, place) => (
                <tr key={place}>
                  <td className="text-13 text-quiet"><span className="leading-9">{place + 1}</span></td>
                  {field.columns.map((column, at) => (
                    <td key={column.name} className="min-w-28" onKeyDown={move(place, at + 1)}>{draw(column, row, place, (next) => onRows(rows.map((old, index) => (index === place ? next : old))))}</td>
                  ))}
                  {!readOnly && <td>{rows.length > field.fewest && <IconButton icon="cross" label={`Remove row ${place + 1}`} onClick={() => onRows(rows.filter((_, index) => index !== place))} />}</td>}
                </tr>
              ))}
            </tbody>
          </table>
        </ScrollSideways>
      )}
      {problem && <FieldError>{problem}</FieldError>}
      {!readOnly && <Button kind="soft" size="tiny" icon="plus" className="mt-2" refusal={rows.length >= most ? `At most ${most} rows are taken.` : undefined} onClick={add}>Add a row</Button>}
    </fieldset>
  )
}
