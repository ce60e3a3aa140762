import { useId, type ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon } from '../icon.tsx'

/** What every field takes. */
export type FieldProps = {
  label: ReactNode
  /** Small, at the right of the label: "if any", "5 d". */
  aside?: ReactNode
  /** Below the box, when there is no error. */
  hint?: ReactNode
  /** What is wrong, in words that name the limit. */
  error?: string | undefined
  /** The way out of the error, as buttons. */
  cures?: ReactNode
  /** Keeps the label for those who listen only; use it where a table's head says it. */
  labelHidden?: boolean
  className?: string
}

/** What `Field` hands to the control inside it. */
export type FieldControl = { id: string; 'aria-invalid': true | undefined; 'aria-describedby': string | undefined }

/** Label above, control, message below. Takes a function that draws the control with the id and descriptions it gets. */
export function Field({ label, aside, hint, error, cures, labelHidden, className, id: given, children }: FieldProps & { id?: string; children: (control: FieldControl) => ReactNode }) {
  const made = useId()
  const id = given ?? made
  const says = error ? `${id}-error` : hint ? `${id}-hint` : undefined
  return (
    <div className={classNames('block min-w-0', className)}>
      <div className={classNames('mb-1 flex justify-between gap-2 text-13 font-medium', labelHidden && 'sr-only')}>
        <label htmlFor={id}>{label}</label>
        {aside && <span className="font-normal text-quiet">{aside}</span>}
      </div>
      {children({ id, 'aria-invalid': error ? true : undefined, 'aria-describedby': says })}
      {error ? <FieldError id={`${id}-error`}>{error}</FieldError> : hint && <p id={`${id}-hint`} className="mt-1.5 text-13 text-quiet">{hint}</p>}
      {cures && <div className="mt-2 flex flex-wrap gap-2">{cures}</div>}
    </div>
  )
}

/** The message below a field; announced when it appears. */
export function FieldError({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <p id={id} role="alert" className="mt-1.5 flex gap-1.5 text-13 text-red">
      <Icon name="stop" className="mt-px" />
      <span>{children}</span>
    </p>
  )
}
