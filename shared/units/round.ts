import { Decimal } from 'decimal.js'

export const roundingRules = ['half-even', 'half-up'] as const
export type RoundingRule = (typeof roundingRules)[number]

/** Digits of a computed double that are believed; the last two or three are noise of binary arithmetic. */
const SIGNIFICANT_DIGITS = 13

/**
 * Rounds to the nearest multiple of `increment`, in decimal arithmetic, and writes the increment's decimals. A tie goes to the even multiple
 * ('half-even': ISO 80000-1 Annex B rule A, ASTM E29) or away from zero ('half-up': ISO 80000-1 Annex B rule B).
 * A decimal string is taken as it stands; a number is first read to 13 significant digits, so that a mean of
 * 62.2499999999999986 counts as the tie 62.25 that it is on paper.
 * @example round('12.325', '0.05') // '12.30'
 * @throws RangeError for a value that is no finite decimal number and for an increment that is not above zero
 */
export function round(value: number | string, increment: string, rule: RoundingRule = 'half-even'): string {
  const step = decimal(increment, 'increment')
  if (!step.isPositive() || step.isZero()) throw new RangeError(`the rounding increment must be above 0, not ${increment}`)
  const exact = typeof value === 'number' ? decimalOf(value) : decimal(value, 'value')
  const rounded = exact.toNearest(step, rule === 'half-even' ? Decimal.ROUND_HALF_EVEN : Decimal.ROUND_HALF_UP)
  return (rounded.isZero() ? rounded.abs() : rounded).toFixed(decimalsOf(increment))
}

/** Decimals that a decimal string is written with: '0.05' has two. */
export function decimalsOf(decimalText: string): number {
  return decimalText.split('.')[1]?.length ?? 0
}

function decimalOf(value: number): Decimal {
  if (!Number.isFinite(value)) throw new RangeError(`cannot round ${value}`)
  return new Decimal(value).toSignificantDigits(SIGNIFICANT_DIGITS)
}

function decimal(text: string, name: string): Decimal {
  if (!/^[+-]?\d+(\.\d+)?$/.test(text)) throw new RangeError(`the ${name} must be a plain decimal number, not ${text}`)
  return new Decimal(text)
}
