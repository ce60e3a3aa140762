import { useMemo, useRef, useState, type ClipboardEvent } from 'react'
import type { OrderFault } from '../../../../shared/api/orders.ts'
import { productForms } from '../../../../shared/method/piece.ts'
import { currencySign, formatAmount } from '../../../lib/format.ts'
import { IconButton } from '../../ui/buttons/icon-button.tsx'
import { ScrollSideways } from '../../ui/table/scroll-sideways.tsx'
import { cellNames } from '../draft/draft-state.ts'
import { rowFaults } from '../draft/row-faults.ts'
import type { OrderDraft } from '../draft/use-order-draft.ts'
import { useRowDeeds } from '../draft/use-row-deeds.ts'
import { usePaste } from '../draft/use-paste.ts'
import { AddTest } from './add-test.tsx'
import { ColumnHead } from './column-head.tsx'
import { placeOf } from './grid-moves.ts'
import { GridRow } from './grid-row.tsx'
import { PastedNote } from './pasted-note.tsx'
import { useGridKeys } from './use-grid-keys.ts'

/** The samples of an order as a grid: typed, pasted from a spreadsheet, ticked down the columns. */
export function SampleGrid({ draft, faults, rowMinor, netMinor, currency }: { draft: OrderDraft; faults: readonly OrderFault[]; rowMinor: readonly number[]; netMinor: number; currency: string }) {
  const { state } = draft
  const { rows, columns } = state
  const grid = useRef<HTMLTableElement>(null)
  const deeds = useRowDeeds(draft)
  const keys = useGridKeys(grid, draft)
  const paste = usePaste(draft)
  const [typing, setTyping] = useState<string | null>(null)
  const found = useMemo(() => rowFaults(state, faults), [faults, state])
  const onPaste = (event: ClipboardEvent) => {
    const place = placeOf(event.target)
    const text = event.clipboardData.getData('text/plain')
    if (!/[\t\n]/.test(text.trim())) return
    event.preventDefault()
    void paste.take(text, { row: place?.row ?? rows.length, cell: place?.column ?? 0 })
  }
  const shown = (id: string) => {
    const own = found.get(id)
    const said = id === typing ? own?.filter(({ wait }) => !wait) : own
    return said && said.length > 0 ? said : undefined
  }
  const chosen = (place: number) => (keys.together && place >= keys.together.from && place <= keys.together.to ? keys.together.column : null)
  const row = { columns, currency, deeds: deeds.rows }
  // one list, so that the fresh row keeps its place in the page, and the cursor in it, when it becomes a sample
  const withFresh = rows.some(({ id }) => id === deeds.fresh.id) ? rows : [...rows, deeds.fresh]
  return (
    <>
      {paste.last && <PastedNote key={paste.last.key} pasted={paste.last.pasted} tests={columns} firstRow={paste.last.firstRow} onColumns={paste.again} onUndo={state === paste.last.pasted.state ? paste.undo : undefined} onClose={paste.close} />}
      <ScrollSideways label="Samples">
        <table
          ref={grid} className="sample-grid" aria-label="Samples of the order" style={{ '--tests': columns.length }} onKeyDown={keys.onKeyDown} onPointerDown={keys.onPointerDown} onPaste={onPaste}
          onFocus={(event) => setTyping(rowIdOf(event.target))} onBlur={(event) => !grid.current?.contains(event.relatedTarget) && setTyping(null)}
        >
          <thead>
            <tr>
              <th scope="col" className="no"><span className="sr-only">Row</span></th>
              <th scope="col" className="w-[86px]">Heat</th>
              <th scope="col" className="w-[76px]">Lot</th>
              <th scope="col">Material</th>
              <th scope="col" className="w-[84px]">Form</th>
              <th scope="col" className="num w-[92px]">Size, mm</th>
              {columns.map((column, at) => (
                <ColumnHead
                  key={column.key} column={column} first={at === 0} rows={rows.length} ticked={rows.filter(({ sample }) => sample.tests.includes(column.key)).length}
                  faults={faults.filter((fault) => fault.row === null && fault.column === column.key)} deeds={deeds.columns}
                />
              ))}
              <th scope="col" className={`w-[48px] p-0! text-center! align-middle! ${columns.length === 0 ? 'first' : ''}`}>
                <AddTest piece={rows[0]?.sample.piece} onAdd={deeds.addTest} trigger={<IconButton icon="plus" label="Add a test" className="mx-auto size-7! border border-edge" />} />
              </th>
              <th scope="col" className="num w-[84px]">Price, {currencySign(currency)}</th>
            </tr>
          </thead>
          <tbody>
            {withFresh.map((one, place) => (
              place < rows.length
                ? <GridRow key={one.id} {...row} row={one} place={place} faults={shown(one.id)} priceMinor={rowMinor[place]} chosen={chosen(place)} />
                : <GridRow key={one.id} {...row} row={one} place={place} fresh chosen={null} />
            ))}
          </tbody>
          <tfoot>
            <tr>
              <td />
              <td colSpan={cellNames.length}>{rows.length === 1 ? '1 sample' : `${rows.length} samples`}</td>
              {columns.map(({ key }, at) => <td key={key} className={at === 0 ? 'tk first' : 'tk'}>{rows.filter(({ sample }) => sample.tests.includes(key)).length}</td>)}
              <td />
              <td className="num">{formatAmount(netMinor, currency)}</td>
            </tr>
          </tfoot>
        </table>
      </ScrollSideways>
      <datalist id="product-forms">{productForms.map((form) => <option key={form} value={form} />)}</datalist>
    </>
  )
}

function rowIdOf(target: EventTarget): string | null {
  return target instanceof HTMLElement ? /^cell-(.+)-[a-z]+$/.exec(target.id)?.[1] ?? null : null
}
