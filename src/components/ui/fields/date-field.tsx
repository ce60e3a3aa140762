import type { ComponentPropsWithRef } from 'react'
import { Field, type FieldProps } from './field.tsx'

/** A calendar day by the browser's own picker; its value is `2026-03-13`. `type="datetime-local"` and `"time"` work too. */
export function DateField({ label, aside, hint, error, cures, labelHidden, className, ...input }: FieldProps & Omit<ComponentPropsWithRef<'input'>, 'className' | 'type'> & { type?: 'date' | 'datetime-local' | 'time' }) {
  return (
    <Field {...{ label, aside, hint, error, cures, labelHidden, className }} id={input.id}>
      {(control) => (
        <span className="box">
          <input type="date" {...input} {...control} />
        </span>
      )}
    </Field>
  )
}
