import type { Bookings } from '../build/bookings.ts'
import { jobFinishes } from './job-finishes.ts'
import { loadSpread } from './load-spread.ts'
import { transfersOf } from './transfers-of.ts'

/** What plans are compared by, in order: steps left out, weighted tardiness, transfers, spread of load. Less is better. */
export type Score = [unplaced: number, weightedTardiness: number, transfers: number, loadSpread: number]

export function score(bookings: Bookings): Score {
  const { shop } = bookings.layout
  const unplaced = bookings.placed.reduce((count, each) => count + (each ? 0 : 1), 0)
  const weighted = jobFinishes(bookings).reduce((sum, { tardiness }, i) => sum + shop.jobs[i]!.weight * tardiness, 0)
  return [unplaced, weighted, transfersOf(bookings).length, loadSpread(bookings)]
}

export function isBetter(a: Score, b: Score): boolean {
  for (let i = 0; i < a.length; i++) if (a[i] !== b[i]) return a[i]! < b[i]!
  return false
}
