import * as z from 'zod'

/** Points that a record may hold. */
export const MOST_POINTS = 2_000_000

/**
 * A column of a record: finite numbers within ± `limit`. Checked in one pass over plain numbers, and only the first fault is told, since a record
 * can hold millions of points and a wrong unit makes every one of them wrong.
 */
export function column(limit: number) {
  return z.custom<readonly number[]>((values) => Array.isArray(values), 'must be a list of numbers').superRefine((numbers: readonly unknown[], context) => {
    const fault = (message: string, path: number[] = []) => context.addIssue({ code: 'custom', message, path, continue: false })
    if (numbers.length < 3) return fault('a record needs at least 3 points')
    if (numbers.length > MOST_POINTS) return fault(`a record may hold ${MOST_POINTS} points, not ${numbers.length}`)
    for (let i = 0; i < numbers.length; i++) {
      const value = numbers[i]
      if (typeof value !== 'number' || !Number.isFinite(value)) return fault('must be a finite number', [i])
      if (value > limit || value < -limit) return fault(`must lie within ± ${limit}, not ${value}`, [i])
    }
  })
}
