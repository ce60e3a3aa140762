import { useState } from 'react'
import type { OrderFault } from '../../../../shared/api/orders.ts'
import { productForms } from '../../../../shared/method/piece.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { sizeText } from '../../../../shared/orders/size-text.ts'
import { formatMoney } from '../../../lib/format.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { SelectField } from '../../ui/fields/select-field.tsx'
import { TextField } from '../../ui/fields/text-field.tsx'
import { Icon } from '../../ui/icon.tsx'
import { AddTest } from '../grid/add-test.tsx'
import { ColumnPanel, requirementWords } from '../grid/column-head.tsx'
import { FaultNotes } from '../grid/fault-notes.tsx'
import type { RowDeeds } from '../grid/grid-row.tsx'
import { cellText, type DraftRow, type DraftState } from '../draft/draft-state.ts'
import { rowFaults, type RowFault } from '../draft/row-faults.ts'
import type { OrderDraft } from '../draft/use-order-draft.ts'
import { useRowDeeds } from '../draft/use-row-deeds.ts'

const shownFirst = 3

/** The samples on the phone: one card each, its tests to press, its fields behind its name. What is faulty is always in sight. */
export function SampleCards({ draft, faults, rowMinor, currency }: { draft: OrderDraft; faults: readonly OrderFault[]; rowMinor: readonly number[]; currency: string }) {
  const { state } = draft
  const deeds = useRowDeeds(draft)
  const [all, setAll] = useState(false)
  const [open, setOpen] = useState<string | null>(null)
  const found = rowFaults(state, faults)
  const shown = state.rows.map((row, place) => ({ row, place })).filter(({ row, place }) => all || place < shownFirst || row.id === open || found.has(row.id))
  const hidden = state.rows.length - shown.length
  return (
    <>
      <div className="mb-2 flex flex-wrap items-center gap-2">
        {state.columns.map((column) => (
          <ColumnPanel
            key={column.key} column={column} deeds={deeds.columns} faults={faults.filter((fault) => fault.row === null && fault.column === column.key)}
            trigger={<Button kind="soft" size="tiny">{orderedTest(column).label}, {requirementWords(column)}</Button>}
          />
        ))}
        <AddTest piece={state.rows[0]?.sample.piece} onAdd={deeds.addTest} trigger={<Button kind="soft" size="tiny" icon="plus">Test</Button>} />
      </div>
      <ul>
        {shown.map(({ row, place }) => (
          <Card
            key={row.id} row={row} place={place} state={state} faults={found.get(row.id) ?? []} price={rowMinor[place] === undefined ? '' : formatMoney(rowMinor[place] ?? 0, currency)}
            open={row.id === open} onOpen={(is) => setOpen(is ? row.id : null)} deeds={deeds.rows}
          />
        ))}
        <li className="flex items-center justify-between gap-3 border-b border-line py-3.5">
          {hidden > 0 ? <Button kind="bare" className="-ml-2" onClick={() => setAll(true)}>{hidden} more {hidden === 1 ? 'sample' : 'samples'}</Button> : <span className="text-quiet">{state.rows.length === 1 ? '1 sample' : `${state.rows.length} samples`}</span>}
          <Button kind="soft" icon="plus" onClick={() => setOpen(deeds.addRow())}>Sample</Button>
        </li>
      </ul>
    </>
  )
}

function Card({ row, place, state, faults, price, open, onOpen, deeds }: { row: DraftRow; place: number; state: DraftState; faults: readonly RowFault[]; price: string; open: boolean; onOpen: (open: boolean) => void; deeds: RowDeeds }) {
  const { id, sample } = row
  const name = [sample.heat, sample.lot].filter(Boolean).join(' / ')
  const error = (cell: RowFault['cell']) => faults.find((fault) => fault.cell === cell)?.message
  const said = open ? faults.filter(({ cell }) => cell === null) : faults
  return (
    <li className="border-b border-line py-3.5">
      <button type="button" aria-expanded={open} onClick={() => onOpen(!open)} className="flex min-h-touch w-full flex-wrap items-baseline gap-x-3 text-left">
        <span className="text-quiet">{place + 1}</span>
        <b className="mono text-17">{name || 'no heat yet'}</b>
        <span className="ml-auto">{price}</span>
        <span className="basis-full">{[sample.material, `${sample.piece.form} ${sizeText(sample.piece)}`.trim()].filter(Boolean).join(', ')} <Icon name={open ? 'up' : 'pen'} className="ml-1 inline align-[-2px] text-quiet" /></span>
      </button>
      {open && (
        <div className="my-3 grid grid-cols-2 gap-3">
          <TextField label="Heat" mono maxLength={60} value={sample.heat} onChange={(event) => deeds.type(id, 'heat', event.target.value)} />
          <TextField label="Lot" mono maxLength={60} value={sample.lot} onChange={(event) => deeds.type(id, 'lot', event.target.value)} />
          <TextField label="Material" className="col-span-full" maxLength={100} value={sample.material} error={error('material')} onChange={(event) => deeds.type(id, 'material', event.target.value)} />
          <SelectField label="Form" choices={productForms.map((form) => ({ value: form, label: form }))} value={sample.piece.form} error={error('form')} onChange={(event) => deeds.type(id, 'form', event.target.value)} />
          <TextField id={`cell-${id}-size`} label="Size" unit="mm" maxLength={40} value={cellText(row, 'size')} error={error('size')} onChange={(event) => deeds.type(id, 'size', event.target.value)} onBlur={() => deeds.left(id, 'size')} />
          <div className="col-span-full flex gap-2">
            <Button kind="soft" size="tiny" onClick={() => deeds.copy(id)}>Copy below</Button>
            <Button kind="danger" size="tiny" onClick={() => deeds.remove(id)}>Delete sample</Button>
          </div>
        </div>
      )}
      <div role="group" aria-label={`Tests of sample ${place + 1}`} className="mt-2.5 flex flex-wrap gap-2">
        {state.columns.map((column) => {
          const ticked = sample.tests.includes(column.key)
          const isBad = faults.some((fault) => fault.column === column.key)
          return (
            <button
              key={column.key} type="button" aria-pressed={ticked} onClick={() => deeds.tick(id, column.key, !ticked)}
              className={classNames('inline-flex min-h-touch items-center gap-1.75 rounded border px-3 text-[0.875rem]', isBad ? 'border-red text-red shadow-[inset_0_0_0_1px_var(--red)]' : ticked ? 'border-ink bg-sheet font-medium' : 'border-edge text-quiet')}
            >
              <Icon name={isBad ? 'stop' : ticked ? 'check' : 'plus'} className="size-3.5!" />
              {orderedTest(column, ticked ? sample.overrides[column.key] : undefined).label}
            </button>
          )
        })}
      </div>
      {said.length > 0 && (
        <div className="mt-2.5">
          <FaultNotes
            id={`why-${id}`} faults={said} columns={state.columns}
            cure={{ override: (key, parameters) => deeds.override(id, key, parameters), untick: (key) => deeds.tick(id, key, false), correct: () => { onOpen(true); requestAnimationFrame(() => deeds.correct(id, 'size')) } }}
          />
        </div>
      )}
    </li>
  )
}
