import { useSyncExternalStore } from 'react'

export const themes = ['light', 'dark', 'system'] as const
export type Theme = (typeof themes)[number]

const place = 'crosshead.theme'
const listeners = new Set<() => void>()

function isTheme(value: string | null): value is Theme {
  return themes.some((theme) => theme === value)
}

/** The chosen theme; `system` until someone chooses, or where the browser keeps nothing. */
export function theme(): Theme {
  try {
    const kept = localStorage.getItem(place)
    return isTheme(kept) ? kept : 'system'
  } catch {
    return 'system'
  }
}

/** Puts the kept theme on the page. Call it first in the entry module, before React draws. */
export function applyTheme(chosen: Theme = theme()): void {
  if (chosen === 'system') delete document.documentElement.dataset['theme']
  else document.documentElement.dataset['theme'] = chosen
}

/** Keeps the choice in this browser, in all its open pages. */
export function chooseTheme(chosen: Theme): void {
  try {
    localStorage.setItem(place, chosen)
  } catch {
    // A browser that keeps nothing shows the choice until it is reloaded.
  }
  applyTheme(chosen)
  for (const listener of listeners) listener()
}

function subscribe(listener: () => void): () => void {
  const other = (event: StorageEvent) => {
    if (event.key !== place) return
    applyTheme()
    listener()
  }
  listeners.add(listener)
  window.addEventListener('storage', other)
  return () => {
    listeners.delete(listener)
    window.removeEventListener('storage', other)
  }
}

/** The chosen theme and how to change it: `const [theme, choose] = useTheme()`. */
export function useTheme(): [Theme, (chosen: Theme) => void] {
  return [useSyncExternalStore(subscribe, theme, () => 'system'), chooseTheme]
}
