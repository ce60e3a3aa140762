import type { Field } from '../method/field.ts'
import { formFields } from '../method/form.ts'
import type { ReportContent } from './content.ts'
import type { ReportedTest } from './reported.ts'
import { linesOf } from './methods-used.ts'

type Annex = ReportContent['readings'][number]

/** Longest list of numbers that is written out; a measured record is told by its length. */
const mostWritten = 20

/** Every reading that counts, by sample and test, with what was struck out and why. `differing` are tests whose lines differ from sample to sample. */
export function readingsAnnex(tests: readonly ReportedTest[], differing: ReadonlySet<string>): Annex[] {
  const fields = new Map<string, Field[]>()
  return tests.flatMap((test): Annex[] => {
    const { method, run, sample, label } = test
    if (!run) return []
    const own = fields.get(method.id) ?? formFields(method.readings)
    fields.set(method.id, own)
    const { columns, rows } = Array.isArray(run.input.readings) ? setOf(run.input.readings, own) : namedOf(run.input.readings, own)
    const lines = differing.has(label) ? linesOf(test) : []
    return [{ sample, label, columns, rows, notes: [...lines, ...run.struck.map(({ path, reason }) => `${placeOf(path, own)} struck out: ${reason}`)] }]
  })
}

function setOf(readings: readonly unknown[], fields: readonly Field[]): { columns: string[]; rows: string[][] } {
  const rows = readings.filter(isRecord)
  const used = fields.filter(({ name }) => rows.some((row) => row[name] !== undefined))
  return { columns: used.map(headOf), rows: rows.map((row) => used.map((field) => written(row[field.name], field))) }
}

function namedOf(readings: unknown, fields: readonly Field[]): { columns: string[]; rows: string[][] } {
  const given = isRecord(readings) ? readings : {}
  const used = fields.filter(({ name }) => given[name] !== undefined)
  return { columns: used.map(headOf), rows: used.length > 0 ? [used.map((field) => written(given[field.name], field))] : [] }
}

function headOf(field: Field): string {
  return 'unit' in field && field.unit ? `${field.label}, ${field.unit}` : field.label
}

function written(value: unknown, field: Field): string {
  if (value === undefined) return ''
  if (Array.isArray(value)) return value.length > mostWritten ? `record of ${value.length} points` : value.map((one) => written(one, field)).join(', ')
  if (isRecord(value)) {
    const longest = Math.max(0, ...Object.values(value).map((one) => (Array.isArray(one) ? one.length : 0)))
    if (longest > mostWritten) return `record of ${longest} points`
    return Object.entries(value).map(([key, one]) => `${key} ${written(one, field)}`).join(', ')
  }
  if (typeof value !== 'number') return typeof value === 'string' ? value : JSON.stringify(value)
  // as it was typed or shown by the machine: with the decimals of its step, and more where there are more
  const decimals = 'step' in field && field.step !== undefined && Number.isInteger(Math.log10(field.step)) ? -Math.log10(field.step) : 0
  const text = String(Number(value.toPrecision(12)))
  return (text.split('.')[1] ?? '').length < decimals && !text.includes('e') ? value.toFixed(decimals) : text
}

function placeOf(path: string, fields: readonly Field[]): string {
  const key = path.split('.')[1] ?? path
  return /^\d+$/.test(key) ? `Reading ${Number(key) + 1}` : (fields.find(({ name }) => name === key)?.label ?? key)
}

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value)
