import { counting } from '../../lib/kept-readings/sheet-readings.ts'
import type { SheetViewProps } from '../sheet-view.ts'

/** Keeps a named value: in its place when that is free or a parameter's, by striking out what stands there otherwise. */
export function keepNamed({ readings, keep, replace, type }: Pick<SheetViewProps, 'readings' | 'keep' | 'replace' | 'type'>, path: string, value: unknown): void {
  const kept = counting(readings).findLast((reading) => reading.path === path)
  if (kept && path.startsWith('readings.')) return replace(kept.key, { path, value })
  keep([{ path, value }])
  type({ [path]: '' })
}
