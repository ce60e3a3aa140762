import type { DerivationStep, Result } from '../../method/method.ts'
import { reportedAs, type Quantity } from '../tensile-rounding.ts'
import type { TensileParameters } from '../tensile-parameters.ts'

type Standard = TensileParameters['standard']

/** Editions that the formulas follow. */
export const editions: Record<Standard, string> = { 'ISO 6892-1': 'ISO 6892-1:2019', 'ASTM E8/E8M': 'ASTM E8/E8M-22' }

/** A number with how it came about, before it is rounded and given its place. */
export type Found = { key: string; symbol: string; value: number; unit: string; quantity: Quantity; derivation: DerivationStep[] }

/** Rounds by the standard and closes the derivation with the reported form. */
export function resultOf(found: Found, standard: Standard): Result {
  const { key, symbol, value, unit, quantity, derivation } = found
  const { reported, step } = reportedAs(value, quantity, standard)
  return { key, symbol, value, unit, reported, basis: editions[standard], approximate: false, derivation: [...derivation, { ...step, value, unit }] }
}
