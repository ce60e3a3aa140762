import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { readTable, type ConversionTable } from '../../../shared/hardness/conversion/conversion-table.ts'
import { conversionTableNames, conversionTables } from '../../../shared/hardness/conversion/conversion-tables.ts'
import { e140Table1 } from '../../../shared/hardness/tables/e140-table-1.ts'
import { e140Table2 } from '../../../shared/hardness/tables/e140-table-2.ts'

const tables = [...new Set(conversionTableNames.flatMap((name) => conversionTables[name]))]

/** ksi of ASTM A370 Table 2 against HRC 59 down to 20, printed in public charts apart from the MPa column. */
const ksi = [351, 338, 325, 313, 301, 292, 283, 273, 264, 255, 246, 238, 229, 221, 215, 208, 201, 194, 188, 182, 177, 171, 166, 161, 156, 152, 149, 146, 141, 138, 135, 131, 128, 125, 123, 119, 117, 115, 112, 110]

describe.each(tables.map((table) => [table.name, table] as const))('%s', (_, table) => {
  it('has rows as wide as its heading, and harder means harder in every column', () => {
    expect(table.rows.every((row) => row.length === table.scales.length)).toBe(true)
    table.scales.forEach((_, column) => {
      const values = table.rows.flatMap((row) => row[column] ?? [])
      const rising = (values.at(-1) ?? 0) > (values[0] ?? 0)
      values.slice(1).forEach((value, i) => expect(rising ? value > values[i]! : value < values[i]!).toBe(true))
    })
  })
  it('has blank cells at the ends of a column only', () => {
    table.scales.forEach((_, column) => {
      const filled = table.rows.map((row) => (row[column] == null ? '.' : '#')).join('')
      expect(filled).toMatch(/^\.*#+\.*$/)
    })
  })
  it('brackets only cells that it has', () => {
    for (const [scale, firsts] of Object.entries(table.bracketed)) {
      const column = table.scales.findIndex((one) => one === scale)
      firsts.forEach((first) => expect(table.rows.find((row) => row[0] === first)?.[column]).not.toBeNull())
    }
  })
  it('converts in the same order and never outside its column', () => {
    fc.assert(fc.property(fc.constantFrom(...table.scales), fc.constantFrom(...table.scales), fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true }), (from, to, a, b) => {
      const [low, high] = ends(table, from)
      const [least, most] = ends(table, to)
      const first = readTable(table, from, low + (high - low) * Math.min(a, b), to)
      const second = readTable(table, from, low + (high - low) * Math.max(a, b), to)
      for (const reading of [first, second]) if (reading) expect(reading.value >= least && reading.value <= most).toBe(true)
      if (first && second) expect(first.value).toBeLessThanOrEqual(second.value)
    }))
  })
  it('never extrapolates', () => {
    for (const from of table.scales) {
      const [low, high] = ends(table, from)
      expect(readTable(table, from, low - 0.01, table.scales[0]!)).toBeUndefined()
      expect(readTable(table, from, high + 0.01, table.scales[0]!)).toBeUndefined()
    }
  })
})

describe('ASTM E140', () => {
  it('has MPa beside HRC that are the ksi of A370, to the nearest 10 (closed form: × 6.894757; 55 HRC was recalled as 2070)', () => {
    ksi.forEach((value, i) => {
      const mpa = readTable(e140Table1, 'HRC', 59 - i, 'tensileStrengthMPa')?.value ?? NaN
      expect(Math.abs(mpa - value * 6.894757)).toBeLessThanOrEqual(5.4)
    })
  })
  it('has straight lines in the HRB range (HRF, HR15T, HR30T, HR45T against HRB, within rounding)', () => {
    for (const scale of ['HRF', 'HR15T', 'HR30T', 'HR45T'] as const) {
      const points = e140Table2.rows.flatMap((row) => { const y = row[e140Table2.scales.indexOf(scale)]; return y == null ? [] : [[row[0]!, y] as const] })
      const meanX = points.reduce((sum, [x]) => sum + x, 0) / points.length
      const meanY = points.reduce((sum, [, y]) => sum + y, 0) / points.length
      const slope = points.reduce((sum, [x, y]) => sum + (x - meanX) * (y - meanY), 0) / points.reduce((sum, [x]) => sum + (x - meanX) ** 2, 0)
      for (const [x, y] of points) expect(Math.abs(meanY + slope * (x - meanX) - y)).toBeLessThan(0.08)
    }
  })
})

function ends(table: ConversionTable, scale: (typeof table.scales)[number]): [number, number] {
  const values = table.rows.flatMap((row) => row[table.scales.indexOf(scale)] ?? [])
  return [Math.min(...values), Math.max(...values)]
}
