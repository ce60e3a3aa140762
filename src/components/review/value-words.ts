import type { Field } from '../../../shared/method/field.ts'
import { formatNumber } from '../../lib/format.ts'
import { asList, asValues } from '../ui/form/field-value.ts'

/** Longer rows of numbers are told by their count. */
const mostNumbers = 12

/** What was kept, in words, drawn from the field it belongs to: "31.4", "10.01, 10.00, 10.00", "2,381 points". Units are said by the caller. */
export function valueWords(field: Field | undefined, value: unknown): string {
  if (value === undefined || value === null || value === '') return ''
  if (typeof value === 'number') return formatNumber(value, field?.kind === 'number' ? stepDecimals(field.step, value) : undefined)
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  if (typeof value === 'string') return field?.kind === 'choice' ? (field.options.find((option) => option.value === value)?.label ?? value) : value
  if (Array.isArray(value)) return listWords(field, value)
  return groupWords(field, value)
}

function listWords(field: Field | undefined, values: readonly unknown[]): string {
  if (values.length > mostNumbers) return `${formatNumber(values.length)} points`
  const columns = field?.kind === 'table' ? field.columns : undefined
  const decimals = field?.kind === 'numbers' ? values.map((one) => (typeof one === 'number' ? stepDecimals(field.step, one) : undefined)).reduce((a, b) => (a === undefined || b === undefined ? undefined : Math.max(a, b)), 0) : undefined
  return values.map((one) => (typeof one === 'number' ? formatNumber(one, decimals) : columns ? fieldsWords(columns, one) : valueWords(undefined, one))).join(columns ? '; ' : ', ')
}

function groupWords(field: Field | undefined, value: unknown): string {
  const parts = asValues(value)
  if (field?.kind === 'variants') {
    const option = field.options.find((one) => one.value === parts[field.key])
    return option ? [option.label, fieldsWords(option.fields, value)].filter(Boolean).join(', ') : JSON.stringify(value)
  }
  const columns = Object.values(parts).map((part) => asList(part).length)
  if (columns.length > 0 && columns.every((length) => length > mostNumbers)) return `${formatNumber(Math.max(...columns))} points`
  return field?.kind === 'group' ? fieldsWords(field.fields, value) : Object.entries(parts).map(([name, part]) => `${name} ${valueWords(undefined, part)}`).join(', ')
}

function fieldsWords(fields: readonly Field[], value: unknown): string {
  const parts = asValues(value)
  return fields.flatMap((field) => {
    const words = valueWords(field, parts[field.name])
    return words === '' ? [] : [`${field.label} ${words}${unitOf(field) ? ` ${unitOf(field)}` : ''}`]
  }).join(', ')
}

/** The unit that numbers of a field are in. */
export function unitOf(field: Field | undefined): string | undefined {
  return field?.kind === 'number' || field?.kind === 'numbers' ? field.unit : undefined
}

/** As many decimals as the step of the field has, or more where the value has more. */
function stepDecimals(step: number | undefined, value: number): number | undefined {
  if (step === undefined) return undefined
  const places = (number: number) => (String(number).split('.')[1] ?? '').length
  return Math.min(6, Math.max(places(step), places(value)))
}
