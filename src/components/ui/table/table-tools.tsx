import { Button } from '../buttons/button.tsx'
import { SelectField } from '../fields/select-field.tsx'
import { columnName, isSortable, type Column } from './column.ts'
import { HeadFilter } from './head-filter.tsx'
import type { TableAddress } from './use-table-address.ts'

/** Sort and filters where the head is not shown: above the cards, below 1024 px. */
export function TableTools<Row>({ columns, address }: { columns: readonly Column<Row>[]; address: TableAddress }) {
  const sortable = columns.filter(isSortable)
  const filtered = columns.filter((column) => column.filter)
  if (sortable.length === 0 && filtered.length === 0) return null
  const set = Object.keys(address.filters).length
  const choices = sortable.flatMap((column) => [
    { value: column.id, label: `${columnName(column)}, up` },
    ...(column.sort === 'only up' ? [] : [{ value: `-${column.id}`, label: `${columnName(column)}, down` }]),
  ])
  return (
    <details className="mb-3 list:hidden">
      <summary className="flex min-h-touch cursor-pointer items-center text-13 font-medium underline underline-offset-3">Sort and filter{set > 0 && `, ${set} set`}</summary>
      <div className="grid grid-cols-2 gap-x-4 gap-y-2 pb-3 max-tablet:grid-cols-1">
        <SelectField
          label="Order"
          empty="as it comes"
          choices={choices}
          value={address.sort ? `${address.sort.down ? '-' : ''}${address.sort.id}` : ''}
          onChange={({ target: { value } }) => address.setSort(value ? { id: value.replace(/^-/, ''), down: value.startsWith('-') } : undefined)}
        />
        {filtered.map((column) => (
          <div key={column.id} className="border-b border-line">
            <span className="text-13 font-medium">{columnName(column)}</span>
            <HeadFilter column={{ ...column, numeric: false }} value={address.filters[column.id] ?? ''} onValue={(value) => address.setFilter(column.id, value)} />
          </div>
        ))}
        {set > 0 && <Button size="tiny" kind="soft" className="self-end justify-self-start" onClick={address.clear}>Take all away</Button>}
      </div>
    </details>
  )
}
