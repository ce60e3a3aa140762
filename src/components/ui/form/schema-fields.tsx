import type { ReactNode } from 'react'
import type { Field } from '../../../../shared/method/field.ts'
import { NumberField } from '../fields/number-field.tsx'
import { SelectField } from '../fields/select-field.tsx'
import { TextField } from '../fields/text-field.tsx'
import { Tick } from '../fields/tick.tsx'
import { asList, asNumber, asText, asValues, initialValues, limitBroken, withValue, type Problems, type Values } from './field-value.ts'
import { NumbersInput } from './numbers-input.tsx'
import { RowsInput } from './rows-input.tsx'

export type SchemaFieldsProps = {
  /** From `formFields(schema)` of shared/method/form.ts. */
  fields: readonly Field[]
  value: Values
  onValue: (value: Values) => void
  /** By path from the start of the form. */
  problems?: Problems
  /** Path of this part in the form: `parameters`. */
  path?: string
  readOnly?: boolean
  className?: string
}

/**
 * Draws the fields of a method's schema: numbers with unit and limits, choices, ticks, text, lists of numbers, rows, groups and
 * choices that decide what follows. Holds no state: `<SchemaFields fields={fields} value={parameters} onValue={setParameters} problems={refusal.fields} />`.
 * With react-hook-form use `SchemaForm`.
 */
export function SchemaFields({ fields, value, onValue, problems = {}, path = '', readOnly = false, className = 'grid grid-cols-[repeat(auto-fill,minmax(min(100%,200px),1fr))] items-start gap-x-5 gap-y-4' }: SchemaFieldsProps) {
  return (
    <div className={className}>
      {fields.map((field) => (
        <OneField key={field.name} field={field} value={value[field.name]} problems={problems} path={join(path, field.name)} readOnly={readOnly} onValue={(next) => onValue(withValue(value, field.name, next))} />
      ))}
    </div>
  )
}

type OneProps = { field: Field; value: unknown; onValue: (value: unknown) => void; problems: Problems; path: string; readOnly: boolean; labelHidden?: boolean }

function OneField({ field, value, onValue, problems, path, readOnly, labelHidden }: OneProps): ReactNode {
  const shared = { label: field.label, labelHidden, hint: field.help, aside: field.optional && !labelHidden ? 'if any' : undefined, error: problems[path], readOnly, name: path }
  switch (field.kind) {
    case 'number':
      return <NumberField {...shared} error={problems[path] ?? limitBroken(field, value)} unit={labelHidden ? undefined : field.unit} step={field.step ?? (field.whole ? 1 : undefined)} min={field.minimum} max={field.maximum} value={asNumber(value)} onValue={onValue} arrows={!labelHidden} />
    case 'text':
      return <TextField {...shared} maxLength={field.longest} value={asText(value)} onChange={(event) => onValue(event.target.value)} />
    case 'boolean':
      return <Tick label={field.label} labelHidden={labelHidden} hint={field.help} error={problems[path]} name={path} checked={value === true} aria-disabled={readOnly || undefined} onChange={(event) => !readOnly && onValue(event.target.checked)} className={labelHidden ? undefined : 'self-end pb-1.5'} />
    case 'choice': {
      const place = field.options.findIndex((option) => option.value === value)
      const only = field.options.length === 1 && !field.optional
      return <SelectField {...shared} empty={only ? undefined : field.optional ? 'not said' : 'choose'} choices={field.options.map((option, index) => ({ value: String(index), label: option.label, disabled: readOnly && index !== place }))} value={place < 0 ? '' : String(place)} onChange={(event) => onValue(field.options[Number(event.target.value || -1)]?.value)} />
    }
    case 'numbers':
      return <NumbersInput field={field} value={asList(value).map(asNumber)} onValue={(next) => onValue(next.length > 0 ? next : undefined)} problems={problems} path={path} readOnly={readOnly} />
    case 'table':
      return (
        <RowsInput
          field={field}
          rows={asList(value).map(asValues)}
          problem={problems[path]}
          readOnly={readOnly}
          onRows={onValue}
          newRow={() => initialValues(field.columns)}
          draw={(column, row, place, set) => <OneField field={column} value={row[column.name]} onValue={(next) => set(withValue(row, column.name, next))} problems={problems} path={`${path}.${place}.${column.name}`} readOnly={readOnly} labelHidden />}
        />
      )
    case 'group':
      return (
        <Group legend={field.label}>
          <SchemaFields fields={field.fields} value={asValues(value)} onValue={onValue} problems={problems} path={path} readOnly={readOnly} />
        </Group>
      )
    case 'variants': {
      const now = asValues(value)
      const option = field.options.find((one) => one.value === now[field.key])
      const choose = (next: string) => {
        const chosen = field.options.find((one) => one.value === next)
        onValue(chosen ? { [field.key]: chosen.value, ...initialValues(chosen.fields) } : undefined)
      }
      return (
        <Group legend={field.label}>
          <div className="grid gap-y-4">
            <SelectField label={`Kind of ${field.label.toLowerCase()}`} labelHidden empty={field.optional ? 'none' : 'choose'} error={problems[join(path, field.key)] ?? problems[path]} choices={field.options.map((one) => ({ value: one.value, label: one.label, disabled: readOnly && one !== option }))} value={option?.value ?? ''} onChange={(event) => choose(event.target.value)} className="max-w-80" />
            {option && option.fields.length > 0 && <SchemaFields fields={option.fields} value={now} onValue={onValue} problems={problems} path={path} readOnly={readOnly} />}
          </div>
        </Group>
      )
    }
  }
}

function Group({ legend, children }: { legend: string; children: ReactNode }) {
  return (
    <fieldset className="col-span-full min-w-0">
      <legend className="mb-1 text-13 font-medium">{legend}</legend>
      {children}
    </fieldset>
  )
}

function join(path: string, name: string): string {
  return path ? `${path}.${name}` : name
}
