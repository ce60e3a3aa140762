import { useEffect, useRef } from 'react'
import { isTyping } from './is-typing.ts'

/** What each key does: `{ n: next, 'ctrl enter': record, '?': showKeys, arrowdown: down }`, names in lower case. */
export type Keys = Record<string, ((event: KeyboardEvent) => void) | undefined>

/** Longer than a scanner leaves between two keys. */
const handMs = 50

/**
 * Binds keys to a page while it is shown. Letters and signs act outside text fields only; in a field that carries
 * `data-keys="letters"` (a number grid, where a letter is never input) they act there too. Combinations with Ctrl act everywhere.
 * Nothing acts while a dialog or a menu is open. A letter acts 50 ms after it was pressed, and not at all when another follows
 * sooner: that is a scanner, and its codes must not strike out a reading.
 */
export function useKeys(keys: Keys, on = true): void {
  const latest = useRef(keys)
  useEffect(() => {
    latest.current = keys
  })
  useEffect(() => {
    if (!on) return
    let waiting: ReturnType<typeof setTimeout> | undefined
    let last = -Infinity
    const press = (event: KeyboardEvent) => {
      const sign = event.key.length === 1
      const burst = sign && event.timeStamp - last < handMs && !event.repeat
      if (sign) last = event.timeStamp
      if (burst) clearTimeout(waiting)
      if (burst || event.defaultPrevented || event.altKey || event.isComposing) return
      const ctrl = event.ctrlKey || event.metaKey
      const name = `${ctrl ? 'ctrl ' : ''}${event.key === ' ' ? 'space' : event.key.toLowerCase()}`
      const act = latest.current[name]
      if (!act || (!ctrl && isTyping(event.target)) || document.querySelector('[data-modal],[role="menu"]')) return
      event.preventDefault()
      if (!sign || ctrl) return act(event)
      clearTimeout(waiting)
      waiting = setTimeout(() => act(event), handMs)
    }
    window.addEventListener('keydown', press)
    return () => {
      clearTimeout(waiting)
      window.removeEventListener('keydown', press)
    }
  }, [on])
}
