import { useEffect, useRef } from 'react'
import { isTyping } from '../buttons/is-typing.ts'

/** A scanner leaves less than this between two keys; hands do not. */
export const burstGapMs = 45
const shortestCode = 4
/** Every code of ours holds a letter; digits alone come from a gauge that types, and are a reading. */
const isCode = (text: string) => text.length >= shortestCode && /[a-z]/i.test(text)

/**
 * Hears a scanner anywhere on the page: a burst of keys that ends in Enter. Keys typed into a text field stay there, except in the
 * scan field itself and in number grids (`data-keys="letters"`).
 */
export function useScanner(onScan: (code: string) => void): void {
  const latest = useRef(onScan)
  useEffect(() => {
    latest.current = onScan
  })
  useEffect(() => {
    let code = ''
    let last = -Infinity
    const press = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || event.key === 'Shift') return
      const quick = event.timeStamp - last <= burstGapMs
      last = event.timeStamp
      if (event.key === 'Enter' && quick && isCode(code) && !isTyping(event.target)) {
        event.preventDefault()
        event.stopPropagation()
        latest.current(code)
        code = ''
      } else if (event.key.length === 1) code = quick ? code + event.key : event.key
      else code = ''
    }
    window.addEventListener('keydown', press, true)
    return () => window.removeEventListener('keydown', press, true)
  }, [])
}
