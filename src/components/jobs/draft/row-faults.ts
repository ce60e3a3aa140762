import type { OrderFault } from '../../../../shared/api/orders.ts'
import { cellNames, unreadWords, type CellName, type DraftRow, type DraftState, type UnreadCell } from './draft-state.ts'

/** What is wrong with one row, and where. `wait`: only something is missing, which is not said while the row is being typed. */
export type RowFault = { cell: CellName | null; column: string | null; message: string; cures: OrderFault['cures']; wait: boolean }

/** The faults of every row by its id: texts that cannot be read, and what the order's own rules say. */
export function rowFaults({ rows }: Pick<DraftState, 'rows'>, faults: readonly OrderFault[]): ReadonlyMap<string, readonly RowFault[]> {
  const found = new Map<string, RowFault[]>()
  rows.forEach((row) => {
    const unread = (['form', 'size'] satisfies UnreadCell[]).filter((cell) => row.unread[cell] !== undefined)
    if (unread.length > 0) found.set(row.id, unread.map((cell) => ({ cell, column: null, message: unreadWords(row, cell), cures: [], wait: cell === 'form' })))
  })
  for (const fault of faults) {
    const row: DraftRow | undefined = fault.row === null ? undefined : rows[fault.row]
    if (!row) continue
    const cell = cellOf(fault.field)
    if (cell === 'size' && (row.unread.size !== undefined || row.unread.form !== undefined)) continue
    const own = found.get(row.id) ?? []
    found.set(row.id, [...own, { cell, column: fault.column, message: fault.message, cures: fault.cures, wait: fault.column === null }])
  }
  return found
}

function cellOf(field: string): CellName | null {
  if (field.startsWith('piece.')) return 'size'
  return cellNames.find((cell) => cell === field) ?? null
}
