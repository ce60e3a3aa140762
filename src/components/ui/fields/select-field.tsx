import type { ComponentPropsWithRef } from 'react'
import { Icon } from '../icon.tsx'
import { Field, type FieldProps } from './field.tsx'

export type Choice = { value: string; label: string; disabled?: boolean }

/** A native choice. `empty` is the first line for "nothing chosen". Works with `register` as it is. */
export function SelectField({ label, aside, hint, error, cures, labelHidden, className, choices, empty, ...select }: FieldProps & Omit<ComponentPropsWithRef<'select'>, 'className' | 'children'> & { choices: readonly Choice[]; empty?: string }) {
  return (
    <Field {...{ label, aside, hint, error, cures, labelHidden, className }} id={select.id}>
      {(control) => (
        <span className="box">
          <select {...select} {...control}>
            {empty !== undefined && <option value="">{empty}</option>}
            {choices.map((choice) => (
              <option key={choice.value} value={choice.value} disabled={choice.disabled}>{choice.label}</option>
            ))}
          </select>
          <Icon name="down" className="pointer-events-none mr-2.5 text-quiet" />
        </span>
      )}
    </Field>
  )
}
