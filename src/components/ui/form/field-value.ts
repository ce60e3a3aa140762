import type { Field } from '../../../../shared/method/field.ts'
import { formatNumber } from '../../../lib/format.ts'

/** What a form holds of an object: nothing is trusted, the method's own schema decides. */
export type Values = Readonly<Record<string, unknown>>
/** What is wrong, by path: `{ 'indents.0.d1': 'must be above 0' }`, as a refusal of the server says it. */
export type Problems = Readonly<Record<string, string>>

export function asValues(value: unknown): Values {
  return typeof value === 'object' && value !== null && !Array.isArray(value) ? Object.fromEntries(Object.entries(value)) : {}
}
export function asList(value: unknown): readonly unknown[] {
  return Array.isArray(value) ? value : []
}
export function asNumber(value: unknown): number | undefined {
  return typeof value === 'number' ? value : undefined
}
export function asText(value: unknown): string {
  return typeof value === 'string' ? value : typeof value === 'number' ? String(value) : ''
}

/** A value put in or taken out; an empty one leaves no key behind, so that optional parameters stay unsaid. */
export function withValue(values: Values, name: string, value: unknown): Values {
  if (value !== undefined && value !== '') return { ...values, [name]: value }
  return Object.fromEntries(Object.entries(values).filter(([key]) => key !== name))
}

/** What a new form or row starts with. */
export function initialValues(fields: readonly Field[]): Values {
  return Object.fromEntries(fields.flatMap((field): [string, unknown][] => {
    if (field.initial !== undefined) return [[field.name, field.initial]]
    if (field.kind === 'variants' && !field.optional && field.options[0]) return [[field.name, { [field.key]: field.options[0].value, ...initialValues(field.options[0].fields) }]]
    if (field.kind === 'group' && !field.optional) return [[field.name, initialValues(field.fields)]]
    if (field.kind === 'choice' && !field.optional && field.options.length === 1) return [[field.name, field.options[0]?.value]]
    if (field.kind === 'table' && field.fewest > 0) return [[field.name, Array.from({ length: field.fewest }, () => initialValues(field.columns))]]
    return []
  }))
}

/** The limit that a value breaks, in words, or nothing. The schema decides in the end; this is said while it is still on screen. */
export function limitBroken(field: Field, value: unknown): string | undefined {
  if (field.kind !== 'number' && field.kind !== 'numbers') return undefined
  if (typeof value !== 'number') return undefined
  const unit = field.unit ? ` ${field.unit}` : ''
  const say = (limit: number) => `${formatNumber(limit)}${unit}`
  if (field.whole && !Number.isInteger(value)) return 'A whole number is needed.'
  if (field.exclusiveMinimum !== undefined && value <= field.exclusiveMinimum) return `Has to be above ${say(field.exclusiveMinimum)}.`
  if (field.minimum !== undefined && value < field.minimum) return `Has to be ${say(field.minimum)} or more.`
  if (field.exclusiveMaximum !== undefined && value >= field.exclusiveMaximum) return `Has to be below ${say(field.exclusiveMaximum)}.`
  if (field.maximum !== undefined && value > field.maximum) return `Has to be ${say(field.maximum)} or less.`
  return undefined
}
