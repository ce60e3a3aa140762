import type { KeyboardEvent, ReactNode } from 'react'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import { FieldError } from '../../components/ui/fields/field.tsx'
import { NumberField } from '../../components/ui/fields/number-field.tsx'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { keepNamed } from './keep-named.ts'

/**
 * One value that is measured several times, a box for each: diameters along a test piece. Enter goes from box to box, and keeps
 * them together from the last one or when the boxes are left by Tab.
 */
export function KeptNumbers({ sheet, path, name = path, label, each, unit, step, count, numbersOf, valueOf, unkept, className }: {
  sheet: SheetViewProps
  path: string
  /** Tells lists apart that are kept in one value. */
  name?: string
  label: ReactNode
  /** "Diameter": the boxes are named by it and a number. */
  each: string
  unit: string
  step: number
  /** Boxes shown at least. */
  count: number
  /** The numbers of what is kept now. */
  numbersOf: (kept: unknown) => readonly number[]
  /** What is kept of these numbers; undefined while it is not whole. */
  valueOf: (numbers: readonly number[], kept: unknown) => unknown
  /** What counts while nothing is kept. */
  unkept?: string | undefined
  className?: string
}) {
  const { method, readings, typed, type, locked } = sheet
  const kept = counting(readings).findLast((reading) => reading.path === path)?.value
  const standing = numbersOf(kept)
  const box = (place: number) => `box.${name}.${place}`
  const isTyped = Array.from({ length: 20 }, (_, place) => place).some((place) => typed[box(place)] !== undefined && typed[box(place)] !== '')
  const numbers = Array.from({ length: Math.max(count, standing.length) }, (_, place) => (typed[box(place)] ? Number(typed[box(place)]) : standing[place]))
  const said = numbers.filter((number) => number !== undefined)
  const value = isTyped ? valueOf(said, kept) : undefined
  const wrong = value === undefined ? null : checkEntry(method, path, value)
  const set = (place: number, number: number | undefined) => {
    const next = numbers.map((old, at) => (at === place ? number : old)).filter((one) => one !== undefined)
    const whole = next.length > 0 ? valueOf(next, kept) : undefined
    type({ [box(place)]: number === undefined ? '' : String(number), [path]: whole === undefined ? '' : JSON.stringify(whole) })
  }
  const keepAll = () => {
    if (!isTyped || value === undefined || wrong !== null) return
    keepNamed(sheet, path, value)
    type({ [path]: '', ...Object.fromEntries(numbers.map((_, place) => [box(place), ''])) })
  }
  const keys = (place: number) => (event: KeyboardEvent<HTMLInputElement>) => {
    const isLast = place === numbers.length - 1
    if (event.ctrlKey || event.metaKey) return
    if (event.key !== 'Enter' && !(event.key === 'Tab' && isLast && !event.shiftKey)) return
    if (isLast) keepAll()
    if (event.key === 'Enter') {
      event.preventDefault()
      const all = [...(event.currentTarget.closest('[data-sheet]')?.querySelectorAll<HTMLElement>('[data-kept]') ?? [])]
      all[all.indexOf(event.currentTarget) + 1]?.focus()
    }
  }
  return (
    <fieldset className={className}>
      <legend className="mb-1 text-13 font-medium">{label}</legend>
      <div className="flex gap-1.5">
        {numbers.map((number, place) => (
          <NumberField
            key={place} className="min-w-18 flex-1" label={`${each} ${place + 1}`} labelHidden value={number} onValue={(next) => set(place, next)} onKeyDown={keys(place)} step={step} arrows={false}
            unit={place === numbers.length - 1 ? unit : undefined} readOnly={Boolean(locked)} data-kept="" data-keys="letters"
          />
        ))}
      </div>
      {wrong ? <FieldError>{wrong}</FieldError> : value !== undefined && <p className="mt-1.5 text-13 text-quiet">Enter keeps them</p>}
      {unkept && !isTyped && standing.length === 0 && !locked && <p className="mt-1.5 text-13 text-amber">{unkept}</p>}
    </fieldset>
  )
}
