import { useMemo, type ReactNode } from 'react'
import { useTable } from '@tanstack/react-table'
import { Button } from '../buttons/button.tsx'
import { classNames } from '../class-names.ts'
import { MessageCard } from '../feedback/message-card.tsx'
import { Tick } from '../fields/tick.tsx'
import type { Column } from './column.ts'
import { HeadCell } from './head-cell.tsx'
import { columnDef, features } from './table-features.ts'
import { TableTools } from './table-tools.tsx'
import { useTableAddress } from './use-table-address.ts'

export type DataTableProps<Row extends object> = {
  /** What the table holds, for those who listen: "Jobs of Brackwater Forge". */
  caption: string
  columns: readonly Column<Row>[]
  rows: readonly Row[]
  rowId: (row: Row) => string
  /** Tells two tables of one page apart in the address. */
  name?: string
  /** The server sorts and filters by the same address (`useTableAddress`); rows are shown as they come. */
  server?: boolean
  /** The row that the page is about, with its ink bar. */
  current?: string | undefined
  selection?: { chosen: ReadonlySet<string>; onChange: (chosen: ReadonlySet<string>) => void; rowName: (row: Row) => string; /** Shown over the table while something is chosen. */ actions?: ReactNode }
  /** When there is nothing at all, not when a filter leaves nothing. */
  empty?: { title: string; text?: ReactNode; action?: ReactNode }
  /** A row that no longer counts: struck and quiet. */
  isVoid?: (row: Row) => boolean
  /** Below the table: how many of how many, and the next part. */
  more?: { total?: number; noun: string; onMore?: () => void; busy?: boolean }
}

/**
 * The list of a page: hairline rows, sticky head with sort and filters, both kept in the address, two-line cards below 1024 px.
 * Columns: see `Column`. Sorting and filtering of what is here, or with `server` of all there is.
 */
export function DataTable<Row extends object>({ caption, columns, rows, rowId, name, server = false, current, selection, empty, isVoid, more }: DataTableProps<Row>) {
  const address = useTableAddress(columns.map((column) => column.id), name)
  const defs = useMemo(() => columns.map((column) => columnDef(column)), [columns])
  const data = useMemo(() => [...rows], [rows])
  const table = useTable({
    features,
    columns: defs,
    data,
    getRowId: rowId,
    manualSorting: server,
    manualFiltering: server,
    enableRowSelection: selection !== undefined,
    state: {
      sorting: address.sort ? [{ id: address.sort.id, desc: address.sort.down }] : [],
      columnFilters: Object.entries(address.filters).map(([id, value]) => ({ id, value })),
      rowSelection: Object.fromEntries([...(selection?.chosen ?? [])].map((id) => [id, true])),
      columnVisibility: Object.fromEntries(columns.map((column) => [column.id, address.switched.includes(column.id) === Boolean(column.hidden)])),
    },
    onRowSelectionChange: (update) => {
      const before = Object.fromEntries([...(selection?.chosen ?? [])].map((id) => [id, true as const]))
      const after = typeof update === 'function' ? update(before) : update
      selection?.onChange(new Set(Object.keys(after).filter((id) => after[id])))
    },
  })
  const byId = new Map(columns.map((column) => [column.id, column]))
  const shown = table.getVisibleLeafColumns().flatMap(({ id }) => byId.get(id) ?? [])
  const found = table.getRowModel().rows
  if (rows.length === 0 && empty && Object.keys(address.filters).length === 0) return <MessageCard title={empty.title} action={empty.action}>{empty.text}</MessageCard>
  return (
    <>
      <TableTools columns={columns} address={address} />
      {selection && selection.chosen.size > 0 && (
        <div role="status" className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2 bg-wash px-3 py-2 text-13">
          <span>{selection.chosen.size} chosen</span>
          {selection.actions}
          <Button size="tiny" kind="bare" onClick={() => selection.onChange(new Set())}>None</Button>
        </div>
      )}
      <table role="table" aria-label={caption} aria-rowcount={more?.total} className="table list">
        <thead role="rowgroup" className="sticky">
          <tr role="row">
            {selection && (
              <th role="columnheader" className="w-8 pr-3!">
                <Tick label="Choose all rows" labelHidden checked={table.getIsAllRowsSelected()} mixed={table.getIsSomeRowsSelected()} onChange={(event) => table.toggleAllRowsSelected(event.target.checked)} />
              </th>
            )}
            {shown.map((column) => <HeadCell key={column.id} column={column} address={address} />)}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {found.map((row) => (
            <tr key={row.id} role="row" aria-selected={selection ? row.getIsSelected() : undefined} className={classNames((row.id === current || row.getIsSelected()) && 'pick', isVoid?.(row.original) && 'void')} aria-current={row.id === current ? 'true' : undefined}>
              {selection && (
                <td role="cell" className="at-tick pr-3!"><Tick label={`Choose ${selection.rowName(row.original)}`} labelHidden checked={row.getIsSelected()} onChange={row.getToggleSelectedHandler()} /></td>
              )}
              {shown.map((column) => (
                <td key={column.id} role="cell" data-head={column.cardHead} className={classNames(column.numeric && 'num', column.nowrap && 'whitespace-nowrap', cardPlaces[column.card ?? 'wide'])}>{column.cell(row.original)}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {found.length === 0 && (
        <p role="status" className="flex flex-wrap items-center gap-3 py-4 text-quiet">
          Nothing fits {Object.keys(address.filters).length > 0 ? 'these filters' : 'here'}.
          {Object.keys(address.filters).length > 0 && <Button size="tiny" kind="soft" onClick={address.clear}>Take the filters away</Button>}
        </p>
      )}
      {more && (
        <p className="mt-4 flex items-center gap-4 text-13 text-quiet">
          <span>{more.total === undefined ? `${found.length} ${more.noun}` : `${found.length} of ${more.total} ${more.noun}`}</span>
          {more.onMore && <Button kind="bare" size="tiny" busy={more.busy} onClick={more.onMore}>Show more</Button>}
        </p>
      )}
    </>
  )
}

const cardPlaces = { start: 'at-start', end: 'at-end', wide: '', 'foot-start': 'at-foot-start', 'foot-end': 'at-foot-end', none: 'not-on-cards' } as const
