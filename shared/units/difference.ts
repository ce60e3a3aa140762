import { Decimal } from 'decimal.js'
import { settled } from './settled.ts'

/** a − b in decimals, each first freed of binary noise: 26.4 − 25.4 is 1, not 0.9999999999999964. */
export function difference(a: number, b: number): number {
  return new Decimal(settled(a)).minus(settled(b)).toNumber()
}
