import { classNames } from '../class-names.ts'
import { columnName, isSortable, type Column } from './column.ts'
import { HeadFilter } from './head-filter.tsx'
import type { TableAddress } from './use-table-address.ts'

/** One cell of the sticky head: name, unit, order, filter. Pressing the name sorts, again turns the order, a third time takes it away. */
export function HeadCell<Row>({ column, address }: { column: Column<Row>; address: TableAddress }) {
  const sorted = address.sort?.id === column.id ? (address.sort.down ? 'descending' : 'ascending') : undefined
  const name = (
    <>
      {column.head}
      {column.unit && <span className="unit">, {column.unit}</span>}
    </>
  )
  const turn = () => {
    const first = column.sort === 'down'
    if (!sorted) return address.setSort({ id: column.id, down: first })
    const isFirst = (sorted === 'descending') === first
    address.setSort(isFirst && column.sort !== 'only up' ? { id: column.id, down: !first } : undefined)
  }
  return (
    <th role="columnheader" scope="col" aria-sort={sorted} className={classNames(column.numeric && 'num')} style={column.share ? { width: `${column.share}%` } : undefined}>
      {isSortable(column) ? (
        <button type="button" onClick={turn} title={`Sort by ${columnName(column).toLowerCase()}`} className="py-0.5 font-medium hover:underline hover:underline-offset-3">
          {name}
          <span aria-hidden className="ml-1 font-normal">{sorted === 'ascending' ? '↑' : sorted === 'descending' ? '↓' : ''}</span>
        </button>
      ) : <span className="inline-block py-0.5">{name}</span>}
      <HeadFilter column={column} value={address.filters[column.id] ?? ''} onValue={(value) => address.setFilter(column.id, value)} />
    </th>
  )
}
