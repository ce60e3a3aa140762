import type { OrderColumn } from '../../../../shared/api/orders.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { cellNames, emptyRow, rowAfter, tidied, unreadWords, withCell, type CellName, type DraftRow, type DraftState } from './draft-state.ts'

/** What a pasted column holds: a cell of the grid, a part of the size, or a test by its key; null is left out. */
export type PastedColumn = CellName | 'diameter' | 'thickness' | 'width' | `test:${string}` | null

export type Pasted = {
  state: DraftState
  /** How many rows came. */
  count: number
  columns: readonly PastedColumn[]
  /** The heading of each column, where there was one. */
  headings: readonly string[] | null
  bad: readonly { row: number; message: string }[]
}

const longestTexts = { heat: 60, lot: 60, material: 100 } as const
const mostRows = 500
const words: [Exclude<PastedColumn, null>, RegExp][] = [
  ['heat', /^(heat|melt|charge|cast|schmelze)\b/], ['lot', /^(lot|batch|los)\b/], ['material', /^(material|grade|steel|alloy|werkstoff|quality)\b/],
  ['form', /^(form|shape|product)\b/], ['diameter', /^(dia|diameter|ø|⌀|d)\b|^ø|^⌀/], ['thickness', /^(thickness|thk|t|wall)\b/], ['width', /^(width|breadth|w)\b/],
  ['size', /^(size|dimension|section|mm)/],
]

/** What the headings of a table stand for; undefined when its first row is no row of headings. */
export function readHeadings(row: readonly string[], tests: readonly OrderColumn[]): PastedColumn[] | undefined {
  const labels = tests.map((column) => ({ key: column.key, label: orderedTest(column).label.toLowerCase() }))
  const columns = row.map((text): PastedColumn => {
    const plain = text.trim().toLowerCase()
    if (plain === '') return null
    const test = labels.find(({ label }) => label === plain || (plain.length > 3 && label.startsWith(plain)))
    return test ? `test:${test.key}` : words.find(([, pattern]) => pattern.test(plain))?.[0] ?? null
  })
  const known = columns.filter((column) => column !== null)
  const isHeading = known.length >= Math.min(2, row.length) && new Set(known).size === known.length && row.every((text) => !/^\s*[\d.,]+\s*$/.test(text))
  return isHeading ? columns : undefined
}

/**
 * Puts a table into the grid. With a heading row (or `columns` chosen by hand) its rows come after the last one; without, its cells fill
 * the grid from the row and cell where the cursor stands, as in a spreadsheet.
 */
export function pasteTable(state: DraftState, table: readonly (readonly string[])[], at: { row: number; cell: number }, chosen?: readonly PastedColumn[]): Pasted {
  const filled = table.filter((row) => row.some((text) => text.trim() !== ''))
  const headings = readHeadings(filled[0] ?? [], state.columns)
  const body = headings ? filled.slice(1) : filled
  const inOrder: PastedColumn[] = [...cellNames, ...state.columns.map(({ key }): PastedColumn => `test:${key}`)].slice(at.cell)
  const columns = chosen ?? headings ?? inOrder
  const start = headings || chosen ? state.rows.length : at.row
  const rows = [...state.rows]
  const bad: { row: number; message: string }[] = []
  const taken = body.slice(0, Math.max(0, mostRows - start))
  taken.forEach((cells, index) => {
    const place = start + index
    const fresh = headings || chosen ? emptyRow(state.columns) : at.cell === 0 || rows.length === 0 ? emptyRow(state.columns) : rowAfter(rows.at(-1))
    const row = fillRow(rows[place] ?? fresh, cells, columns, (message) => bad.push({ row: place + 1, message }))
    rows[place] = tidied(row)
  })
  if (taken.length < body.length) bad.push({ row: mostRows, message: `an order holds ${mostRows} samples; ${body.length - taken.length} rows were left out` })
  return { state: { ...state, rows }, count: taken.length, columns, headings: headings ? filled[0] ?? null : null, bad }
}

/** A row with the cells that were pasted; those beyond the end of a short line stay as they were. */
function fillRow(row: DraftRow, cells: readonly string[], all: readonly PastedColumn[], complain: (message: string) => void): DraftRow {
  const columns = all.slice(0, cells.length)
  const text = (column: PastedColumn) => (columns.includes(column) ? (cells[columns.indexOf(column)] ?? '').trim() : '')
  let next = row
  for (const cell of ['heat', 'lot', 'material'] satisfies CellName[]) {
    if (!columns.includes(cell)) continue
    const longest = longestTexts[cell]
    if (text(cell).length > longest) complain(`${cell}: “${text(cell).slice(0, 20)}…” was cut, at most ${longest} characters are kept`)
    next = withCell(next, cell, text(cell).slice(0, longest))
  }
  if (columns.includes('form') && text('form') !== '') next = withCell(next, 'form', text('form'))
  const size = text('size') || sizeOf(text('diameter'), text('thickness'), text('width'))
  if (size !== '') next = withCell(next, 'size', size)
  for (const cell of ['form', 'size'] as const) {
    const why = unreadWords(next, cell)
    if (why) complain(`${cell}: ${why}`)
  }
  const ticks = columns.flatMap((column, at) => (column?.startsWith('test:') ? [{ key: column.slice(5), on: isTick(cells[at] ?? '') }] : []))
  if (ticks.length > 0) {
    const others = next.sample.tests.filter((key) => !ticks.some((tick) => tick.key === key))
    next = { ...next, sample: { ...next.sample, tests: [...others, ...ticks.filter(({ on }) => on).map(({ key }) => key)] } }
  }
  return next
}

/** A diameter that stands alone is read like any size: lists call a sheet's thickness so too. */
function sizeOf(diameter: string, thickness: string, width: string): string {
  const flat = [thickness, width].filter((part) => part !== '')
  if (diameter === '' || flat.length === 0) return [diameter, ...flat].filter((part) => part !== '').join(' × ')
  return [`Ø ${diameter.replace(/^[Øø⌀]\s*/, '')}`, ...flat].join(' × ')
}

function isTick(text: string): boolean {
  return !/^\s*(|0|no|n|-|–|false|nein)\s*$/i.test(text)
}

/** What was recognised, in a sentence. */
export function pastedWords({ columns, headings }: Pasted): string {
  const known = columns.slice(0, headings?.length ?? columns.length).flatMap((column, at) => (column === null ? [] : [{ column, heading: headings?.[at]?.trim() ?? '' }]))
  if (!headings) return ''
  const cells = known.map(({ column }) => (column.startsWith('test:') ? 'ticks' : column === 'diameter' || column === 'thickness' || column === 'width' ? 'size' : column))
  const names = [...new Set(cells)]
  const list = names.length > 1 ? `${names.slice(0, -1).join(', ')} and ${names.at(-1)}` : names.join('')
  const left = headings.filter((_, at) => columns[at] === null && headings[at]?.trim() !== '')
  return `${list.charAt(0).toUpperCase()}${list.slice(1)} ${names.length === 1 ? 'was' : 'were'} recognised by ${names.length === 1 ? 'its heading' : 'their headings'}.${left.length > 0 ? ` Left out: ${left.join(', ')}.` : ''}`
}
