import { checkEntry } from '../../shared/method/check-entry.ts'
import type { Entry } from '../../shared/method/entries.ts'
import { formFields } from '../../shared/method/form.ts'
import type { Method } from '../../shared/method/method.ts'
import { readNumber } from '../components/ui/fields/read-number.ts'
import { locale } from '../lib/format.ts'
import type { Typed } from '../lib/kept-readings/half-typed.ts'
import type { SheetReading } from '../lib/kept-readings/sheet-readings.ts'
import { nextRow } from './set/set-rows.ts'

/** The name of a half-typed cell of the row that is typed now. */
export const cellName = (column: string) => `row.${column}`

/** What is typed and would be kept as it stands: the row of a set, or named values. */
export function pendingEntries(method: Method, typed: Typed, readings: readonly SheetReading[]): Entry[] {
  const entries = method.isSet ? pendingRow(method, typed, readings) : Object.entries(typed).flatMap(([path, text]): Entry[] => (isPath(path) && text.trim() !== '' ? [{ path, value: typedValue(text) }] : []))
  return entries.filter(({ path, value }) => value !== undefined && checkEntry(method, path, value) === null)
}

/** Whether something stands in a field that is not kept yet. */
export function isHalfTyped(method: Method, typed: Typed): boolean {
  return Object.entries(typed).some(([name, text]) => text.trim() !== '' && (method.isSet ? name.startsWith('row.') : isPath(name)))
}

/** A number as people type it, or JSON where a form keeps something larger. */
export function typedValue(text: string): unknown {
  if (!/^\s*[[{"]|^(true|false)$/.test(text)) return readNumber(text, locale()).value
  try {
    return JSON.parse(text) as unknown
  } catch {
    return undefined
  }
}

/** The values of the row that is typed now, without its empty cells. */
export function typedRow(method: Method, typed: Typed): Record<string, unknown> {
  return Object.fromEntries(formFields(method.readings).flatMap((field) => {
    const text = typed[cellName(field.name)]?.trim() ?? ''
    if (text === '') return []
    const value = field.kind === 'number' || field.kind === 'numbers' ? typedValue(text) : field.kind === 'text' ? text : (typedValue(text) ?? text)
    return value === undefined ? [] : [[field.name, value]]
  }))
}

function pendingRow(method: Method, typed: Typed, readings: readonly SheetReading[]): Entry[] {
  const value = typedRow(method, typed)
  return Object.keys(value).length === 0 ? [] : [{ path: `readings.${nextRow(readings)}`, value }]
}

function isPath(name: string): boolean {
  return name.startsWith('readings.') || name.startsWith('parameters.')
}
