import type { Reading } from '../../../shared/api/test-runs.ts'
import type { QueueState } from './reading-queue.ts'

/** A reading as the sheet shows it, wherever it is kept. */
export type SheetReading = {
  key: string
  path: string
  value: unknown
  /** ISO 8601; of the server once it has it. */
  at: string
  struck: { reason: string } | null
  where: 'server' | 'device'
  /** Another reading has its place; it counts once that is settled. */
  clash: boolean
  /** Why the server does not keep it. */
  refused: string | undefined
}

/** What the server has and what is still on this device, in the order it was kept. */
export function sheetReadings(kept: readonly Reading[], { unsent, clashes, refused }: Pick<QueueState, 'unsent' | 'clashes' | 'refused'>): SheetReading[] {
  const known = new Set(kept.map(({ key }) => key))
  const strikes = new Map(unsent.flatMap((item) => (item.kind === 'strike' ? [[item.key, item.reason] as const] : [])))
  const strikeOf = (key: string) => {
    const reason = strikes.get(key)
    return reason === undefined ? null : { reason }
  }
  const server = kept.map(({ key, path, value, at, struck }): SheetReading => ({ key, path, value, at, struck: struck ?? strikeOf(key), where: 'server', clash: false, refused: undefined }))
  const device = unsent.flatMap((item): SheetReading[] => {
    if (item.kind !== 'keep' || known.has(item.key)) return []
    return [{ key: item.key, path: item.path, value: item.value, at: new Date(item.at).toISOString(), struck: strikeOf(item.key), where: 'device', clash: clashes.has(item.key), refused: refused[item.key] }]
  })
  return [...server, ...device]
}

/** Those that count: neither struck out nor waiting for a decision. */
export function counting(readings: readonly SheetReading[]): SheetReading[] {
  return readings.filter(({ struck, clash, refused }) => !struck && !clash && refused === undefined)
}
