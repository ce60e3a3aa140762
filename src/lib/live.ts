import type { QueryClient } from '@tanstack/react-query'
import { useEffect, useSyncExternalStore } from 'react'
import * as z from 'zod'
import { Change, readChanges } from '../../shared/api/changes.ts'
import { addressOf } from './call.ts'

/** Makes everything on screen that shows the changed thing fetch itself again. Query keys start with the subject's name. */
export function refresh(client: QueryClient, { subject, id }: Change): Promise<void> {
  return client.invalidateQueries({ predicate: ({ queryKey: [name, what, which] }) => name === subject && (what !== 'one' || which === id) })
}

const Changes = z.array(Change)
let connected = false
let lastAt: number | null = null
const listeners = new Set<() => void>()
function tell(isConnected: boolean): void {
  connected = isConnected
  lastAt = Date.now()
  for (const listener of listeners) listener()
}

/** Listens to the server while someone is signed in. The browser sends the last number seen when it connects again, so nothing is missed. */
export function useLive(client: QueryClient, active: boolean): void {
  useEffect(() => {
    if (!active || typeof EventSource === 'undefined') return
    const source = new EventSource(addressOf(readChanges))
    source.addEventListener('hello', () => tell(true))
    source.addEventListener('everything', () => { tell(true); void client.invalidateQueries() })
    source.addEventListener('changes', (event: MessageEvent<string>) => {
      tell(true)
      for (const change of Changes.parse(JSON.parse(event.data))) void refresh(client, change)
    })
    source.onerror = () => {
      tell(false)
      if (source.readyState === EventSource.CLOSED) void client.invalidateQueries({ queryKey: ['Session'] })
    }
    return () => source.close()
  }, [client, active])
}

const subscribe = (listener: () => void) => { listeners.add(listener); return () => { listeners.delete(listener) } }

/** Whether changes elsewhere arrive, and when the last word came. */
export function useLiveState(): { connected: boolean; lastAt: number | null } {
  const isConnected = useSyncExternalStore(subscribe, () => connected, () => false)
  const at = useSyncExternalStore(subscribe, () => lastAt, () => null)
  return { connected: isConnected, lastAt: at }
}
