import type { ReactNode } from 'react'

/** What a cell is worth for sorting, filtering and files. */
export type CellValue = string | number | null | undefined

/** A column of a table of `Row`s. Keep the list of columns stable (outside of the component, or in useMemo). */
export type Column<Row> = {
  id: string
  head: ReactNode
  /** Said in the head once, after the name. */
  unit?: string
  /** The head as plain text, where `head` is not: for files, the menu of columns and the sort choice. */
  name?: string
  cell: (row: Row) => ReactNode
  /** Enables sorting, filtering and export of the column. */
  value?: (row: Row) => CellValue
  /** Right-aligned. */
  numeric?: boolean
  /** Sorting by this column; true when it has a value. `down` starts with the greatest; `only up` is for servers that know one way. */
  sort?: boolean | 'down' | 'only up'
  filter?: { kind: 'text'; words: string } | { kind: 'choice'; all: string; choices: readonly { value: string; label: string }[]; of?: (row: Row) => CellValue }
  /** The cell takes this share of the width, in percent. */
  share?: number
  nowrap?: boolean
  /** Where it stands on the two-line card below 1024 px: first line, a line of its own, or the foot. */
  card?: 'start' | 'end' | 'wide' | 'foot-start' | 'foot-end' | 'none'
  /** Words before the value on the card, where the head is not seen. */
  cardHead?: string
  /** Left out of the table until someone chooses it. */
  hidden?: boolean
}

/** Name of a column in plain text. */
export function columnName<Row>(column: Column<Row>): string {
  const head = column.name ?? (typeof column.head === 'string' ? column.head : column.id)
  return column.unit ? `${head}, ${column.unit}` : head
}

export function isSortable<Row>(column: Column<Row>): boolean {
  return column.sort === undefined ? column.value !== undefined : Boolean(column.sort)
}
