import { useSyncExternalStore } from 'react'

const asked = '(max-width: 700px)'
const query = () => (typeof window.matchMedia === 'function' ? window.matchMedia(asked) : null)

function subscribe(listener: () => void): () => void {
  const media = query()
  media?.addEventListener('change', listener)
  return () => media?.removeEventListener('change', listener)
}

/** Whether the page stands on a phone: the grid becomes cards there. */
export function usePhone(): boolean {
  return useSyncExternalStore(subscribe, () => query()?.matches ?? false, () => false)
}
