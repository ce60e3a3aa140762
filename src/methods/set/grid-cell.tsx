import type { NumberField } from '../../../shared/method/field.ts'
import { readNumber } from '../../components/ui/fields/read-number.ts'
import { classNames } from '../../components/ui/class-names.ts'
import { locale } from '../../lib/format.ts'

/** One field of the row that is typed now. Letters are never input here, so the page's keys act; the main one is read at arm's length. */
export function GridCell({ field, label, text, onText, isMain, isCarried, readOnly, describedBy, autoFocus }: {
  field: NumberField
  label: string
  text: string
  onText: (text: string) => void
  isMain: boolean
  /** Taken over from the row before, not typed. */
  isCarried: boolean
  readOnly: boolean
  describedBy: string | undefined
  autoFocus: boolean
}) {
  const isUnreadable = readNumber(text, locale()).problem !== undefined
  return (
    <td className={classNames('h-12.5 border-b border-line p-0', isMain ? 'w-33' : 'w-22')}>
      <input
        type="text" inputMode="decimal" autoComplete="off" name={field.name} aria-label={label} data-keys="letters" value={text} readOnly={readOnly} autoFocus={autoFocus}
        aria-invalid={isUnreadable || describedBy !== undefined || undefined} aria-describedby={describedBy}
        onFocus={(event) => isCarried && event.target.select()}
        onChange={(event) => onText(event.target.value.replace(/[^\d.,\-−+\s]/g, ''))}
        className={classNames('h-12.5 w-full rounded bg-paper px-3 focus:outline-3 focus:-outline-offset-2 focus:outline-ink', isMain ? 'font-mono text-26 font-medium tracking-tight' : 'text-right', isCarried && 'text-quiet', isUnreadable && 'text-red')}
      />
    </td>
  )
}
