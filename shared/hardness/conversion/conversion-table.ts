import type { ConversionScale } from './conversion-scale.ts'

/** A published conversion table as printed. Rows run one way down the table; null is a blank cell. */
export type ConversionTable = {
  name: string
  /** How the standard reports a converted value: whole numbers, or Rockwell scales to 0.1 and the others whole. */
  reporting: 'whole' | 'tenths'
  scales: readonly ConversionScale[]
  rows: readonly (readonly (number | null)[])[]
  /** Entries printed in brackets, for information only: per scale, the first cells of their rows. */
  bracketed: Partial<Record<ConversionScale, readonly number[]>>
}

/** A value read from a table; `informative` when an entry used, on either side, is printed in brackets. */
export type TableReading = { value: number; informative: boolean }

/**
 * Reads `to` beside `value` of `from`, linear between neighbouring rows. Undefined where the table has no answer: a
 * scale that it lacks, a value outside its rows, a blank cell among the two that would be used. It never extrapolates.
 * @example between the rows 35 HRC / 345 HV and 34 HRC / 336 HV, 34.5 HRC reads 340.5 HV
 */
export function readTable(table: ConversionTable, from: ConversionScale, value: number, to: ConversionScale): TableReading | undefined {
  const fromColumn = table.scales.indexOf(from)
  const toColumn = table.scales.indexOf(to)
  if (fromColumn < 0 || toColumn < 0) return undefined
  const isBracketed = (row: readonly (number | null)[]) =>
    [from, to].some((scale) => row[0] != null && (table.bracketed[scale]?.includes(row[0]) ?? false))
  const exact = table.rows.find((row) => row[fromColumn] === value)
  if (exact) {
    const answer = exact[toColumn]
    return answer == null ? undefined : { value: answer, informative: isBracketed(exact) }
  }
  for (const [index, row] of table.rows.entries()) {
    const next = table.rows[index + 1]
    const start = row[fromColumn]
    const end = next?.[fromColumn]
    if (!next || start == null || end == null || (value - start) * (value - end) > 0) continue
    const first = row[toColumn]
    const second = next[toColumn]
    if (first == null || second == null) return undefined
    return { value: first + ((second - first) * (value - start)) / (end - start), informative: isBracketed(row) || isBracketed(next) }
  }
  return undefined
}
