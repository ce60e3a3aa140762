import type { Reading } from '../../../shared/api/test-runs.ts'
import type { Unsent } from './unsent.ts'

/**
 * Keys of unsent readings whose place another reading has taken meanwhile, on the server or earlier among the unsent. A place
 * is free again when what stands there is struck out. Parameters take no place: the later one counts.
 */
export function clashing(kept: readonly Pick<Reading, 'key' | 'path' | 'struck'>[], unsent: readonly Unsent[]): ReadonlySet<string> {
  const struck = new Set(unsent.flatMap((item) => (item.kind === 'strike' ? [item.key] : [])))
  const taken = new Set(kept.filter((reading) => !reading.struck && !struck.has(reading.key)).map((reading) => reading.path))
  const clashes = new Set<string>()
  for (const item of unsent) {
    if (item.kind !== 'keep' || item.path.startsWith('parameters.') || struck.has(item.key)) continue
    if (taken.has(item.path)) clashes.add(item.key)
    else taken.add(item.path)
  }
  return clashes
}
