import { useState } from 'react'
import { Button } from '../../ui/buttons/button.tsx'
import { Note } from '../../ui/feedback/note.tsx'
import { Popover } from '../../ui/feedback/popover.tsx'
import { SelectField } from '../../ui/fields/select-field.tsx'
import type { OrderColumn } from '../../../../shared/api/orders.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { cellNames } from '../draft/draft-state.ts'
import { pastedWords, type Pasted, type PastedColumn } from '../draft/paste-table.ts'

/** What came of pasting: how many rows, how their columns were read, what could not be read, and the ways back. */
export function PastedNote({ pasted, tests, firstRow, onColumns, onUndo, onClose }: {
  pasted: Pasted
  tests: readonly OrderColumn[]
  /** An example below each heading. */
  firstRow: readonly string[]
  onColumns: (columns: readonly PastedColumn[]) => void
  /** Missing once something else was changed. */
  onUndo: (() => void) | undefined
  onClose: () => void
}) {
  const [open, setOpen] = useState(false)
  const [columns, setColumns] = useState(pasted.columns)
  const { count, bad, headings } = pasted
  const choices = [
    ...cellNames.map((cell) => ({ value: cell, label: cell.charAt(0).toUpperCase() + cell.slice(1) })), { value: 'diameter', label: 'Diameter' }, { value: 'thickness', label: 'Thickness' }, { value: 'width', label: 'Width' },
    ...tests.map((column) => ({ value: `test:${column.key}`, label: `Ticks of ${orderedTest(column).label}` })),
  ]
  const choose = (at: number, value: string) => {
    const known = choices.find((choice) => choice.value === value)
    setColumns(columns.map((column, place) => (place === at ? (known ? asColumn(known.value) : null) : column)))
  }
  return (
    <Note icon="paste" kind={bad.length > 0 ? 'warn' : 'plain'} live className="mb-3 text-13" title={`${count} ${count === 1 ? 'row' : 'rows'} pasted.`}>
      {pastedWords(pasted)}
      <span className="ml-1 inline-flex flex-wrap">
        {headings && (
          <Popover label="Columns of the pasted rows" open={open} onOpenChange={setOpen} trigger={<Button size="tiny" kind="bare">Change columns</Button>}>
            <h3 className="mb-3 text-15 font-bold">What the columns hold</h3>
            <div className="grid gap-3">
              {headings.map((heading, at) => (
                <SelectField key={at} label={heading.trim() || `Column ${at + 1}`} aside={firstRow[at]} empty="left out" choices={choices} value={columns[at] ?? ''} onChange={(event) => choose(at, event.target.value)} />
              ))}
              <Button kind="main" onClick={() => { setOpen(false); onColumns(columns) }}>Read the rows like this</Button>
            </div>
          </Popover>
        )}
        {onUndo && <Button size="tiny" kind="bare" onClick={onUndo}>Undo</Button>}
        <Button size="tiny" kind="bare" onClick={onClose}>Close</Button>
      </span>
      {bad.length > 0 && (
        <ul className="mt-1 list-disc pl-4">
          {bad.slice(0, 8).map(({ row, message }) => <li key={`${row} ${message}`}>Row {row}, {message}</li>)}
          {bad.length > 8 && <li>and {bad.length - 8} more; each is marked in the grid</li>}
        </ul>
      )}
    </Note>
  )
}

function asColumn(value: string): PastedColumn {
  const cell = ([...cellNames, 'diameter', 'thickness', 'width'] as const).find((one) => one === value)
  return cell ?? (value.startsWith('test:') ? `test:${value.slice(5)}` : null)
}
