import { productForms, type Piece } from '../../../../shared/method/piece.ts'
import type { Order, OrderColumn, OrderSample } from '../../../../shared/api/orders.ts'
import { sizeText } from '../../../../shared/orders/size-text.ts'
import { readSize } from './read-size.ts'

/** Cells whose text may not be readable; their text is kept as typed until it is. */
export type UnreadCell = 'form' | 'size'
export type TextCell = 'heat' | 'lot' | 'material'
export type CellName = TextCell | UnreadCell
export const cellNames: readonly CellName[] = ['heat', 'lot', 'material', 'form', 'size']

/** A row of the grid: the sample as it is ordered, with a key of its own and the texts that could not be read. */
export type DraftRow = { id: string; sample: OrderSample; unread: Partial<Record<UnreadCell, string>>; /** The size as typed, while it says the same. */ size?: string }
export type DraftHead = Omit<Order, 'columns' | 'samples'>
/** The order as it stands on the screen. */
export type DraftState = { head: DraftHead; columns: readonly OrderColumn[]; rows: readonly DraftRow[] }

let made = 0
const newId = () => `r${Date.now().toString(36)}${(made++).toString(36)}`

export function draftOf({ columns, samples, ...head }: Order): DraftState {
  return { head, columns, rows: samples.map((sample) => ({ id: newId(), sample, unread: {} })) }
}

export function orderOf({ head, columns, rows }: DraftState): Order {
  return { ...head, columns: [...columns], samples: rows.map(({ sample }) => sample) }
}

/** A new row, like the one above it but for heat and lot. */
export function rowAfter(above: DraftRow | undefined): DraftRow {
  const sample: OrderSample = above ? { ...above.sample, heat: '', lot: '' } : { heat: '', lot: '', material: '', piece: { form: 'bar' }, tests: [], overrides: {} }
  return { id: newId(), sample, unread: {}, ...(above?.size !== undefined && { size: above.size }) }
}

/** A row without anything in it yet, all tests of the columns ticked. */
export function emptyRow(columns: readonly OrderColumn[]): DraftRow {
  return { id: newId(), sample: { heat: '', lot: '', material: '', piece: { form: 'bar' }, tests: columns.map(({ key }) => key), overrides: {} }, unread: {} }
}

/** What a cell shows. */
export function cellText({ sample, unread, size }: DraftRow, cell: CellName): string {
  if (cell === 'form') return unread.form ?? sample.piece.form
  if (cell === 'size') return unread.size ?? size ?? sizeText(sample.piece)
  return sample[cell]
}

/**
 * A row with a cell typed anew. A form or size that cannot be read is kept as text, and the sample keeps what it had before. `typing`: the
 * cursor is still in it, so a form counts only when it is written out, or its beginning would be completed under the hands of who types on.
 */
export function withCell(row: DraftRow, cell: CellName, text: string, typing = false): DraftRow {
  if (cell === 'size') return row.unread.form === undefined ? withSize(row, row.sample.piece.form, text) : { ...row, size: text }
  if (cell !== 'form') return { ...row, sample: { ...row.sample, [cell]: text } }
  const form = typing ? productForms.find((one) => one === text.trim().toLowerCase()) : readForm(text)
  const size = cellText(row, 'size')
  // a size is read by its form; without one it waits as text, so that the order never holds a size of the wrong form
  if (!form) return { ...row, sample: { ...row.sample, piece: { form: row.sample.piece.form } }, size, unread: { ...row.unread, form: text } }
  return withSize({ ...row, unread: without(row.unread, 'form') }, form, form === row.sample.piece.form ? size : size.replace(/^[Øø⌀]\s*/, ''))
}

function withSize(row: DraftRow, form: Piece['form'], text: string): DraftRow {
  const { piece } = readSize(form, text)
  const unread = without(row.unread, 'size')
  if (!piece) return { ...row, sample: { ...row.sample, piece: { form } }, unread: { ...unread, size: text } }
  return { ...row, sample: { ...row.sample, piece }, unread, size: text }
}

/** When the cursor leaves a form it is read by how it begins, and a size is written as the trade writes it. */
export function tidied(row: DraftRow): DraftRow {
  if (row.unread.form !== undefined) return withCell(row, 'form', row.unread.form)
  return without(row, 'size')
}

/** A product form by its name or how it begins: "Bar", "forg". */
export function readForm(text: string): Piece['form'] | undefined {
  const plain = text.trim().toLowerCase()
  return plain === '' ? undefined : productForms.find((form) => form === plain) ?? productForms.find((form) => plain.length > 1 && form.startsWith(plain)) ?? aliases[plain]
}
const aliases: Record<string, Piece['form']> = { round: 'bar', rod: 'bar', 'round bar': 'bar', 'flat bar': 'bar', pipe: 'tube', strip: 'sheet', disc: 'forging', disk: 'forging', forged: 'forging', cast: 'casting' }

/** Why a cell cannot be read, in words; empty when it can. */
export function unreadWords(row: DraftRow, cell: UnreadCell): string {
  const text = row.unread[cell]
  if (text === undefined) return ''
  return cell === 'form' ? `${text === '' ? 'a form is needed' : `“${text}” is no form`}: ${productForms.join(', ')}` : readSize(row.sample.piece.form, text).problem ?? ''
}

/** Ticks or unticks a test for some rows; what was set for a row alone goes with its tick. */
export function withTick(state: DraftState, key: string, ids: ReadonlySet<string>, ticked: boolean): DraftState {
  return withRows(state, ids, ({ sample, ...row }) => {
    const others = sample.tests.filter((test) => test !== key)
    return { ...row, sample: { ...sample, tests: ticked ? [...others, key] : others, overrides: ticked ? sample.overrides : without(sample.overrides, key) } }
  })
}

export function withRows(state: DraftState, ids: ReadonlySet<string>, change: (row: DraftRow) => DraftRow): DraftState {
  return { ...state, rows: state.rows.map((row) => (ids.has(row.id) ? change(row) : row)) }
}

/** A free key for a new column. */
export function freeKey(columns: readonly OrderColumn[]): string {
  for (let at = 1; ; at++) if (!columns.some(({ key }) => key === `t${at}`)) return `t${at}`
}

export function withoutColumn(state: DraftState, key: string): DraftState {
  const untouched = withTick(state, key, new Set(state.rows.map(({ id }) => id)), false)
  return { ...untouched, columns: state.columns.filter((column) => column.key !== key) }
}

function without<T extends object, K extends keyof T>(whole: T, key: K): Omit<T, K> {
  const rest = { ...whole }
  delete rest[key]
  return rest
}

/** A copy of a row under it. */
export function withCopy(state: DraftState, id: string): DraftState {
  return { ...state, rows: state.rows.flatMap((row) => (row.id === id ? [row, { ...row, id: newId() }] : [row])) }
}
