import { useController, type Control, type FieldErrors, type FieldPath, type FieldValues } from 'react-hook-form'
import type { Field } from '../../../../shared/method/field.ts'
import { asValues, type Problems } from './field-value.ts'
import { SchemaFields } from './schema-fields.tsx'

/**
 * `SchemaFields` as a part of a react-hook-form form: `<SchemaForm control={control} name="parameters" fields={fields} />`.
 * Errors of the resolver and of `setError('parameters.thicknessMm', …)` stand at their fields.
 */
export function SchemaForm<Form extends FieldValues>({ control, name, fields, readOnly, className }: { control: Control<Form>; name: FieldPath<Form>; fields: readonly Field[]; readOnly?: boolean; className?: string }) {
  const { field, formState } = useController({ control, name })
  return <SchemaFields fields={fields} value={asValues(field.value)} onValue={field.onChange} problems={flatErrors(formState.errors)} path={name} readOnly={readOnly} className={className} />
}

/** The errors of react-hook-form by path: `{ 'parameters.forceKgf': 'must be above 0' }`. */
export function flatErrors(errors: FieldErrors): Problems {
  return Object.fromEntries(walk(errors, ''))
}

function walk(node: unknown, path: string): [string, string][] {
  if (typeof node !== 'object' || node === null) return []
  const own: unknown = Reflect.get(node, 'message')
  const here: [string, string][] = typeof own === 'string' && path ? [[path, own]] : []
  const inner = Object.entries(node).filter(([key]) => !['ref', 'message', 'type', 'types'].includes(key) || (key === 'type' && typeof Reflect.get(node, key) === 'object'))
  return [...here, ...inner.flatMap(([key, value]) => walk(value, path ? `${path}.${key}` : key))]
}
