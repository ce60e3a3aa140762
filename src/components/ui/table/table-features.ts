import {
  columnFilteringFeature,
  columnVisibilityFeature,
  createFilteredRowModel,
  createSortedRowModel,
  rowSelectionFeature,
  rowSortingFeature,
  tableFeatures,
  type ColumnDef,
} from '@tanstack/react-table'
import { isSortable, type CellValue, type Column } from './column.ts'

/** What our tables can do; the rest of the library is left out of the bundle. */
export const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  columnFilteringFeature,
  filteredRowModel: createFilteredRowModel(),
  rowSelectionFeature,
  columnVisibilityFeature,
})

/** Our column as the library wants it. */
export function columnDef<Row extends object>(column: Column<Row>): ColumnDef<typeof features, Row> {
  return {
    id: column.id,
    accessorFn: (row) => column.value?.(row) ?? undefined,
    enableSorting: isSortable(column),
    sortDescFirst: column.sort === 'down',
    sortUndefined: 'last',
    sortFn: (a, b) => compare(column.value?.(a.original), column.value?.(b.original)),
    enableColumnFilter: column.filter !== undefined,
    filterFn: (row, _id, wanted: unknown) => isWanted(column, row.original, String(wanted)),
  }
}

function compare(a: CellValue, b: CellValue): number {
  if (a == null || b == null) return a == null ? (b == null ? 0 : 1) : -1
  if (typeof a === 'number' && typeof b === 'number') return a - b
  return String(a).localeCompare(String(b), undefined, { numeric: true, sensitivity: 'base' })
}

function isWanted<Row>(column: Column<Row>, row: Row, wanted: string): boolean {
  if (column.filter?.kind === 'choice') return String((column.filter.of ?? column.value)?.(row) ?? '') === wanted
  const text = String(column.value?.(row) ?? '').toLowerCase()
  return wanted.toLowerCase().split(/\s+/).every((word) => text.includes(word))
}
