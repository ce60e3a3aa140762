import { counting, type SheetReading } from '../../lib/kept-readings/sheet-readings.ts'

/** A row of a set as it is shown. `number` counts from 1 among those that count, as the rules' messages do. */
export type SetRow = { reading: SheetReading; index: number; number: number; counts: boolean }

/** The rows of a set in the order of their numbers, struck ones where they stood. `withTyped`: the row being typed counts already. */
export function setRows(readings: readonly SheetReading[], withTyped: boolean): SetRow[] {
  const sorted = readings.map((reading) => ({ reading, index: rowIndex(reading.path) })).filter(({ index }) => index >= 0).sort((a, b) => a.index - b.index)
  const live = new Set(counting(readings))
  const next = nextRow(readings)
  return sorted.map(({ reading, index }) => {
    const before = sorted.filter((other) => other.index < index && live.has(other.reading)).length
    return { reading, index, counts: live.has(reading), number: before + 1 + (withTyped && next < index ? 1 : 0) }
  })
}

/** The first number that no counting row has: after the last one, or where one was struck out. */
export function nextRow(readings: readonly SheetReading[]): number {
  const taken = new Set(counting(readings).map(({ path }) => rowIndex(path)))
  let next = 0
  while (taken.has(next)) next++
  return next
}

/** The row that a path names; −1 for one that names none. */
export function rowIndex(path: string): number {
  const [side, key] = path.split('.')
  return side === 'readings' && key !== undefined && /^\d+$/.test(key) ? Number(key) : -1
}
