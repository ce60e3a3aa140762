import { useId, type ReactNode } from 'react'
import { classNames } from '../class-names.ts'
import { FieldError } from './field.tsx'

export type RadioChoice = { value: string; label: ReactNode; hint?: ReactNode; /** Why it cannot be chosen. */ refusal?: string }

/** One of a few, all in sight: `<RadioGroup legend="Which heat is right?" choices={…} value={answer} onValue={setAnswer} />`. */
export function RadioGroup({ legend, legendHidden, choices, value, onValue, name, error, across = false, className }: {
  legend: ReactNode
  legendHidden?: boolean
  choices: readonly RadioChoice[]
  value: string | undefined
  onValue: (value: string) => void
  name?: string
  error?: string | undefined
  /** Side by side instead of one under the other. */
  across?: boolean
  className?: string
}) {
  const made = useId()
  return (
    <fieldset className={classNames('min-w-0', className)} aria-invalid={error ? true : undefined} aria-describedby={error ? `${made}-error` : undefined}>
      <legend className={legendHidden ? 'sr-only' : 'mb-2 text-13 font-medium'}>{legend}</legend>
      <div className={classNames('flex gap-x-6 gap-y-2', across ? 'flex-wrap' : 'flex-col items-start')}>
        {choices.map((choice) => (
          <label key={choice.value} className="tick">
            <input
              type="radio"
              name={name ?? made}
              value={choice.value}
              checked={choice.value === value}
              onChange={() => !choice.refusal && onValue(choice.value)}
              {...(choice.refusal && { 'aria-disabled': true })}
            />
            <i aria-hidden />
            <span className={choice.refusal ? 'text-quiet' : undefined}>
              {choice.label}
              {(choice.refusal ?? choice.hint) && <span className="block text-13 text-quiet">{choice.refusal ?? choice.hint}</span>}
            </span>
          </label>
        ))}
      </div>
      {error && <FieldError id={`${made}-error`}>{error}</FieldError>}
    </fieldset>
  )
}
