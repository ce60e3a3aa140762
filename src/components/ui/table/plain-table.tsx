import type { ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { columnName, type Column } from './column.ts'
import { ScrollSideways } from './scroll-sideways.tsx'

/**
 * A small table of a few rows, without sorting and filters: results, budgets, the numbers behind a picture.
 * It stays a table on the phone and scrolls sideways when it must.
 */
export function PlainTable<Row>({ caption, columns, rows, rowId, current, foot, className }: { caption: string; columns: readonly Column<Row>[]; rows: readonly Row[]; rowId: (row: Row) => string; current?: string; foot?: ReactNode; className?: string }) {
  return (
    <ScrollSideways label={caption} className={className}>
      <table className="table" aria-label={caption}>
        <thead>
          <tr>
            {columns.map((column) => (
              <th key={column.id} scope="col" className={classNames(column.numeric && 'num')} style={column.share ? { width: `${column.share}%` } : undefined}>
                {column.head === '' ? <span className="sr-only">{columnName(column)}</span> : column.head}
                {column.unit && <span className="unit">, {column.unit}</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowId(row)} className={rowId(row) === current ? 'pick' : undefined}>
              {columns.map((column) => <td key={column.id} className={classNames(column.numeric && 'num', column.nowrap && 'whitespace-nowrap')}>{column.cell(row)}</td>)}
            </tr>
          ))}
        </tbody>
        {foot && <tfoot>{foot}</tfoot>}
      </table>
    </ScrollSideways>
  )
}
