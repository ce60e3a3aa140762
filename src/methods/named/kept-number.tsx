import type { KeyboardEvent, ReactNode } from 'react'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import { NumberField } from '../../components/ui/fields/number-field.tsx'
import { readNumber } from '../../components/ui/fields/read-number.ts'
import { locale } from '../../lib/format.ts'
import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import type { SheetViewProps } from '../sheet-view.ts'
import { keepNamed } from './keep-named.ts'

/**
 * One named number of the sheet. Enter or Tab keeps it; one that is kept already is struck out with a reason and replaced. What is
 * typed and not kept says so.
 */
export function KeptNumber({ sheet, path, label, aside, unit, step, className }: { sheet: SheetViewProps; path: string; label: ReactNode; aside?: ReactNode; unit?: string | undefined; step?: number | undefined; className?: string }) {
  const { method, run, readings, typed, type, locked } = sheet
  const [side, name = ''] = path.split('.')
  const kept = counting(readings).findLast((reading) => reading.path === path)
  const clash = readings.find((reading) => reading.clash && reading.path === path && !reading.struck)
  const standing = kept?.value ?? (side === 'parameters' ? run.parameters[name] : undefined)
  const text = typed[path] ?? ''
  const value = text === '' ? (typeof standing === 'number' ? standing : undefined) : readNumber(text, locale()).value
  const wrong = text !== '' && value !== undefined ? checkEntry(method, path, value) : null
  const isOpen = text !== '' && value !== undefined && wrong === null && value !== standing
  const keepIt = () => {
    if (isOpen) keepNamed(sheet, path, value)
    else if (text !== '' && value === standing) type({ [path]: '' })
  }
  const keys = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Escape' && text !== '') return type({ [path]: '' })
    if ((event.key !== 'Enter' && event.key !== 'Tab') || event.ctrlKey || event.metaKey) return
    keepIt()
    if (event.key === 'Enter') {
      event.preventDefault()
      focusNext(event.currentTarget)
    }
  }
  return (
    <NumberField
      className={className} label={label} aside={aside} unit={unit} step={step} arrows={false} readOnly={Boolean(locked)} data-kept="" data-keys="letters"
      value={value} onValue={(next) => type({ [path]: next === undefined ? '' : String(next) })} onKeyDown={keys}
      error={wrong ?? (clash ? `Another screen has kept ${String(kept?.value)}; ${String(clash.value)} is on this device.` : undefined)}
      hint={isOpen ? 'Enter keeps it' : undefined}
      cures={clash && !locked ? <ClashCures sheet={sheet} mine={clash.key} other={kept?.key} /> : undefined}
    />
  )
}

function ClashCures({ sheet: { settle }, mine, other }: { sheet: SheetViewProps; mine: string; other: string | undefined }) {
  const look = 'min-h-touch rounded border border-edge px-3 text-13 hover:bg-wash'
  return (
    <>
      {other && <button type="button" className={look} onClick={() => settle.useMine(mine, other)}>Use mine</button>}
      <button type="button" className={look} onClick={() => settle.drop(mine)}>Leave mine out</button>
    </>
  )
}

/** On to the next field of the sheet, as Enter does in a grid. */
function focusNext(from: HTMLElement): void {
  const all = [...(from.closest('[data-sheet]')?.querySelectorAll<HTMLElement>('[data-kept]') ?? [])]
  const next = all[all.indexOf(from) + 1]
  if (next) next.focus()
  else from.blur()
}
