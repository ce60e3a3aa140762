import { round, type RoundingRule } from './round.ts'

/** `round`, as a number: for arithmetic on what was reported. Two multiples of one increment compare equal when they are. */
export function roundNumber(value: number | string, increment: string, rule: RoundingRule = 'half-even'): number {
  return Number(round(value, increment, rule))
}
