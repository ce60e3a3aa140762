import type { OrderColumn } from '../../../../shared/api/orders.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { asSentence } from '../../../lib/refused-field.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Note } from '../../ui/feedback/note.tsx'
import type { RowFault } from '../draft/row-faults.ts'

export type Cure = {
  override: (key: string, parameters: Record<string, unknown>) => void
  untick: (key: string) => void
  correct: (cell: 'form' | 'size' | 'heat' | 'lot' | 'material') => void
}

/** What is wrong with a row, each with its way out as buttons. */
export function FaultNotes({ faults, columns, cure, id }: { faults: readonly RowFault[]; columns: readonly OrderColumn[]; cure: Cure; id: string }) {
  return (
    <div id={id} className="grid gap-px">
      {faults.map((fault, place) => {
        const column = columns.find(({ key }) => key === fault.column)
        const cell = fault.cell ?? (column ? 'size' : null)
        return (
          <Note
            key={place} kind="bad" title={asSentence(fault.message)} className="whitespace-normal"
            actions={
              (column || cell) && (
                <>
                  {column && fault.cures.map(({ label, parameters }) => <Button key={label} size="tiny" onClick={() => cure.override(column.key, parameters)}>{label}, this row only</Button>)}
                  {column && <Button size="tiny" kind="soft" onClick={() => cure.untick(column.key)}>Untick {orderedTest(column).label}</Button>}
                  {cell && <Button size="tiny" kind={column ? 'bare' : 'soft'} onClick={() => cure.correct(cell)}>Correct the {cell}</Button>}
                </>
              )
            }
          />
        )
      })}
    </div>
  )
}
