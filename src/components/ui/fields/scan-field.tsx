import { useRef, useState } from 'react'
import { useKeys } from '../buttons/use-keys.ts'
import { classNames } from '../class-names.ts'
import { Icon } from '../icon.tsx'
import { Kbd } from '../kbd.tsx'
import { burstGapMs, useScanner } from './use-scanner.ts'

/**
 * The field in brackets. `/` puts the cursor in it. A scanner's burst ending in Enter calls `onScan(code)`, wherever the cursor is
 * outside other text; Enter after typing by hand calls `onSearch(text)`, or `onScan` when there is no search.
 * With `folds` it is a button-sized bracket on the phone and opens when touched.
 */
export function ScanField({ onScan, onSearch, label = 'Scan a label or search', folds = false, busy = false, className }: {
  onScan: (code: string) => void
  onSearch?: (text: string) => void
  label?: string
  folds?: boolean
  busy?: boolean
  className?: string
}) {
  const input = useRef<HTMLInputElement>(null)
  const [text, setText] = useState('')
  const last = useRef({ at: -Infinity, quick: 0 })
  useKeys({ '/': () => input.current?.focus() })
  useScanner(onScan)
  const send = () => {
    const code = text.trim()
    if (!code) return
    const scanned = last.current.quick >= code.length - 1 && code.length > 3
    setText('')
    if (scanned || !onSearch) onScan(code)
    else onSearch(code)
  }
  return (
    <label className={classNames('scan', folds && 'scan-folds', className)}>
      <Icon name="scan" className={folds ? 'max-tablet:size-5! max-tablet:text-ink' : undefined} />
      <span className="sr-only">{label}</span>
      <input
        ref={input}
        type="text"
        enterKeyHint="search"
        autoComplete="off"
        autoCapitalize="off"
        spellCheck={false}
        placeholder={label}
        value={text}
        onChange={(event) => setText(event.target.value)}
        onKeyDown={(event) => {
          const quick = event.timeStamp - last.current.at <= burstGapMs
          last.current = { at: event.timeStamp, quick: event.key.length === 1 ? (quick ? last.current.quick + 1 : 0) : last.current.quick }
          if (event.key === 'Enter') {
            event.preventDefault()
            send()
          }
          if (event.key === 'Escape') {
            setText('')
            event.currentTarget.blur()
          }
        }}
      />
      {busy ? <span className="busy-ring" role="status" aria-label="Looking it up" /> : <span aria-hidden className={folds ? 'max-tablet:hidden' : undefined}><Kbd>/</Kbd></span>}
    </label>
  )
}
