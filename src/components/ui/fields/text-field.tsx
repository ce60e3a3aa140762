import type { ComponentPropsWithRef, ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon, type IconName } from '../icon.tsx'
import { Field, type FieldProps } from './field.tsx'

export type TextFieldProps = FieldProps &
  Omit<ComponentPropsWithRef<'input'>, 'className'> & {
    /** Inside at the right. */
    unit?: ReactNode
    /** Inside at the left. */
    icon?: IconName
    /** For codes: heat numbers, report numbers. */
    mono?: boolean
  }

/**
 * One line of text; also e-mail, password and search by `type`. Works with react-hook-form as it is:
 * `<TextField label="Purchase order" error={errors.order?.message} {...register('order')} />`.
 */
export function TextField({ label, aside, hint, error, cures, labelHidden, className, unit, icon, mono, ...input }: TextFieldProps) {
  return (
    <Field {...{ label, aside, hint, error, cures, labelHidden, className }} id={input.id}>
      {(control) => (
        <span className="box">
          {icon && <Icon name={icon} className="ml-2.5 text-quiet" />}
          <input type="text" autoComplete="off" {...input} {...control} className={classNames(mono && 'mono')} />
          {unit && <span className="unit pr-2.5 text-13 whitespace-nowrap">{unit}</span>}
        </span>
      )}
    </Field>
  )
}
