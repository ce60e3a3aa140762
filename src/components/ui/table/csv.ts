import { columnName, type CellValue, type Column } from './column.ts'

/**
 * A table as CSV (RFC 4180: CRLF, quotes doubled), with a decimal point whatever the locale. Text that a spreadsheet would run as a
 * formula (= + - @, tab or return in front) gets an apostrophe.
 */
export function csvText<Row>(columns: readonly Column<Row>[], rows: readonly Row[]): string {
  const written = columns.filter((column) => column.value !== undefined)
  const lines = [written.map(columnName), ...rows.map((row) => written.map((column) => column.value?.(row)))]
  return lines.map((line) => line.map(csvCell).join(',')).join('\r\n') + '\r\n'
}

export function csvCell(value: CellValue): string {
  if (value == null) return ''
  if (typeof value === 'number') return String(value)
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe
}

/** Hands a text to the browser as a file. The mark in front tells spreadsheets that it is UTF-8. */
export function downloadCsv(name: string, text: string): void {
  const address = URL.createObjectURL(new Blob(['\ufeff', text], { type: 'text/csv;charset=utf-8' }))
  const link = document.createElement('a')
  link.href = address
  link.download = name.endsWith('.csv') ? name : `${name}.csv`
  link.click()
  URL.revokeObjectURL(address)
}
