import { round } from './round.ts'

/**
 * A number rounded half to even to so many significant figures and written out in plain decimals: for quantities whose
 * standard fixes no decimals. 3 figures: 17.4, 0.0575, 1230.
 */
export function significant(value: number, figures: number): string {
  if (value === 0) return round(0, incrementFor(figures - 1))
  const exponent = Math.floor(Math.log10(Math.abs(value)))
  const text = round(value, incrementFor(figures - 1 - exponent))
  // 9.996 to three figures has become 10.00: one decimal fewer
  return Math.floor(Math.log10(Math.abs(Number(text)))) > exponent ? round(value, incrementFor(figures - 2 - exponent)) : text
}

/** '0.01' for two decimals, '1' for none, '10' for minus one. */
function incrementFor(decimals: number): string {
  return decimals > 0 ? `0.${'0'.repeat(decimals - 1)}1` : `1${'0'.repeat(-decimals)}`
}
