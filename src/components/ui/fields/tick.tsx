import type { ComponentPropsWithRef, ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { Icon } from '../icon.tsx'
import { FieldError } from './field.tsx'

export type TickProps = Omit<ComponentPropsWithRef<'input'>, 'type' | 'children'> & {
  label: ReactNode
  /** Label for those who listen only, as in a grid. */
  labelHidden?: boolean
  /** Some but not all of what it stands for. */
  mixed?: boolean
  /** Second line. */
  hint?: ReactNode
  error?: string | undefined
}

/** A box to tick: `<Tick label="Return samples" checked={back} onChange={…} />`, or with `register`. */
export function Tick({ label, labelHidden, mixed = false, hint, error, className, ref, ...input }: TickProps) {
  const set = (element: HTMLInputElement | null) => {
    if (element) element.indeterminate = mixed
    if (typeof ref === 'function') return ref(element)
    if (ref) ref.current = element
  }
  return (
    <div className={classNames('min-w-0', className)}>
      <label className="tick">
        <input type="checkbox" {...input} ref={set} aria-invalid={error ? true : undefined} />
        <i aria-hidden><Icon name="check" className="size-3.5!" /></i>
        <span className={labelHidden ? 'sr-only' : undefined}>
          {label}
          {hint && <span className="block text-13 text-quiet">{hint}</span>}
        </span>
      </label>
      {error && <FieldError>{error}</FieldError>}
    </div>
  )
}
