import { Button } from '../buttons/button.tsx'
import { Menu } from '../feedback/menu.tsx'
import { columnName, type Column } from './column.ts'
import { useTableAddress } from './use-table-address.ts'

/** Which columns a table shows, kept in the address: put it beside the page's other soft buttons, with the table's columns and name. */
export function ColumnChoice<Row>({ columns, name }: { columns: readonly Column<Row>[]; name?: string }) {
  const address = useTableAddress(columns.map((column) => column.id), name)
  const items = columns.map((column) => ({
    kind: 'tick' as const,
    label: columnName(column),
    checked: address.switched.includes(column.id) === Boolean(column.hidden),
    onChange: () => address.setSwitched(address.switched.includes(column.id) ? address.switched.filter((id) => id !== column.id) : [...address.switched, column.id]),
  }))
  return <span className="max-list:hidden"><Menu label="Columns" items={items} trigger={<Button kind="soft" icon="columns">Columns</Button>} /></span>
}
