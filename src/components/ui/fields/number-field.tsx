import { useState, type ComponentPropsWithRef, type KeyboardEvent, type ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { formatNumber, locale } from '../../../lib/format.ts'
import { Field, type FieldProps } from './field.tsx'
import { readNumber, stepDecimals } from './read-number.ts'

export type NumberFieldProps = FieldProps &
  Omit<ComponentPropsWithRef<'input'>, 'className' | 'value' | 'defaultValue' | 'onChange' | 'type' | 'min' | 'max' | 'step'> & {
    /** Undefined is an empty field. */
    value: number | undefined
    /** Called with each number typed; with undefined when empty or unreadable. */
    onValue: (value: number | undefined) => void
    unit?: ReactNode
    /** Finest difference that is entered; decides the decimals shown and what the arrow keys add. */
    step?: number
    min?: number
    max?: number
    /** Shown before the field takes its final form: 'raw' is the 26 px mono of a bench reading. */
    look?: 'field' | 'raw'
    /** Whether ↑ and ↓ add and take one step; off in grids, where they change rows. */
    arrows?: boolean
  }

/**
 * A number with its unit inside at the right. Takes comma and point as decimal mark, shows the person's own when left.
 * It says itself what cannot be read; limits come as `error` from the form's schema.
 */
export function NumberField({ label, aside, hint, error, cures, labelHidden, className, value, onValue, unit, step, min, max, look = 'field', arrows = true, onBlur, onKeyDown, onFocus, ...input }: NumberFieldProps) {
  const [typed, setTyped] = useState<string | undefined>()
  const show = (number: number) => plain(number, step)
  const reading = typed === undefined ? undefined : readNumber(typed, locale())
  const text = typed ?? (value === undefined ? '' : show(value))
  const type = (next: string) => {
    setTyped(next)
    onValue(readNumber(next, locale()).value)
  }
  const addStep = (event: KeyboardEvent<HTMLInputElement>) => {
    onKeyDown?.(event)
    if (event.defaultPrevented || !arrows || !step || input.readOnly || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return
    event.preventDefault()
    const raw = (reading?.value ?? value ?? 0) + (event.key === 'ArrowUp' ? step : -step)
    const next = Number(Math.min(max ?? Infinity, Math.max(min ?? -Infinity, raw)).toFixed(stepDecimals(step)))
    setTyped(show(next))
    onValue(next)
  }
  return (
    <Field {...{ label, aside, hint, cures, labelHidden, className }} error={error ?? reading?.problem} id={input.id}>
      {(control) => (
        <span className="box">
          <input
            type="text"
            inputMode="decimal"
            autoComplete="off"
            role="spinbutton"
            aria-valuenow={value}
            aria-valuemin={min}
            aria-valuemax={max}
            aria-valuetext={value === undefined ? 'empty' : typeof unit === 'string' ? `${text} ${unit}` : text}
            {...input}
            {...control}
            value={text}
            onChange={(event) => type(event.target.value)}
            onKeyDown={addStep}
            onFocus={(event) => {
              event.target.select()
              onFocus?.(event)
            }}
            onBlur={(event) => {
              if (!reading?.problem) setTyped(undefined)
              onBlur?.(event)
            }}
            className={classNames('text-right', unit != null && 'pr-1.5!', look === 'raw' && 'text-left! font-mono text-26 font-medium tracking-tight')}
          />
          {unit && <span className="unit pr-2.5 text-13 whitespace-nowrap" aria-hidden>{unit}</span>}
        </span>
      )}
    </Field>
  )
}

/** As typed by hand: no marks between thousands, at least the decimals of the step. */
function plain(value: number, step: number | undefined): string {
  const decimals = Math.max(step ? stepDecimals(step) : 0, stepDecimals(value))
  const grouped = new Intl.NumberFormat(locale(), { useGrouping: false, minimumFractionDigits: Math.min(decimals, 12), maximumFractionDigits: Math.min(decimals, 12) })
  return Number.isFinite(value) ? grouped.format(value) : formatNumber(value)
}
