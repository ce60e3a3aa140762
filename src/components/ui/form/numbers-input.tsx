import type { ClipboardEvent } from 'react'
import type { NumbersField } from '../../../../shared/method/field.ts'
import { locale } from '../../../lib/format.ts'
import { IconButton } from '../buttons/icon-button.tsx'
import { Button } from '../buttons/button.tsx'
import { FieldError } from '../fields/field.tsx'
import { NumberField } from '../fields/number-field.tsx'
import { readNumber } from '../fields/read-number.ts'
import { limitBroken, type Problems } from './field-value.ts'

/** A list of numbers, one box each; several can be pasted at once, as from a spreadsheet's row or column. */
export function NumbersInput({ field, value, onValue, problems, path, readOnly }: { field: NumbersField; value: readonly (number | undefined)[]; onValue: (value: readonly (number | undefined)[]) => void; problems: Problems; path: string; readOnly: boolean }) {
  const boxes = Array.from({ length: Math.max(value.length, field.fewest, 1) }, (_, place) => value[place])
  const most = field.most ?? 1000
  const set = (place: number, number: number | undefined) => onValue(boxes.map((old, at) => (at === place ? number : old)))
  const paste = (place: number) => (event: ClipboardEvent) => {
    const numbers = event.clipboardData.getData('text').trim().split(/[\t\r\n;]+/).map((text) => readNumber(text, locale()).value)
    if (numbers.length < 2 || readOnly) return
    event.preventDefault()
    onValue([...boxes.slice(0, place), ...numbers, ...boxes.slice(place + numbers.length)].slice(0, most))
  }
  return (
    <fieldset className="col-span-full min-w-0">
      <legend className="mb-1 text-13 font-medium">{field.label}{field.unit && <span className="unit">, {field.unit}</span>}</legend>
      <div className="flex flex-wrap items-start gap-2">
        {boxes.map((number, place) => (
          <span key={place} className="flex w-36 items-start" onPaste={paste(place)}>
            <NumberField label={`${field.label} ${place + 1}`} labelHidden className="flex-1" value={number} onValue={(next) => set(place, next)} step={field.step ?? (field.whole ? 1 : undefined)} error={problems[`${path}.${place}`] ?? limitBroken(field, number)} readOnly={readOnly} arrows={false} />
            {!readOnly && boxes.length > Math.max(field.fewest, 1) && <IconButton icon="cross" label={`Remove ${field.label.toLowerCase()} ${place + 1}`} className="w-7!" onClick={() => onValue(boxes.filter((_, at) => at !== place))} />}
          </span>
        ))}
        {!readOnly && <Button kind="soft" icon="plus" refusal={boxes.length >= most ? `At most ${most} are taken.` : undefined} onClick={() => onValue([...boxes, undefined])}>One more</Button>}
      </div>
      {field.help && <p className="mt-1.5 text-13 text-quiet">{field.help}</p>}
      {problems[path] && <FieldError>{problems[path]}</FieldError>}
    </fieldset>
  )
}
