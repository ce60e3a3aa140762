import type { ComponentPropsWithRef } from 'react'
import { Field, type FieldProps } from './field.tsx'

/** Several lines of text: `<TextArea label="What changed" rows={3} {...register('note')} />`. */
export function TextArea({ label, aside, hint, error, cures, labelHidden, className, ...area }: FieldProps & Omit<ComponentPropsWithRef<'textarea'>, 'className'>) {
  return (
    <Field {...{ label, aside, hint, error, cures, labelHidden, className }} id={area.id}>
      {(control) => (
        <span className="box">
          <textarea rows={3} {...area} {...control} />
        </span>
      )}
    </Field>
  )
}
