import { round } from '../../units/round.ts'

/** A strain for a formula: in %, four decimals, in brackets when negative. */
export function percentText(strain: number): string {
  const text = round(100 * strain, '0.0001')
  return text.startsWith('-') && Number(text) !== 0 ? `(${text})` : text.replace('-', '')
}
