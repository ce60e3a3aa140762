import type { ConversionTable } from './conversion-table.ts'
import { e140Table1 } from '../tables/e140-table-1.ts'
import { e140Table2 } from '../tables/e140-table-2.ts'
import { iso18265TableA1 } from '../tables/iso18265-table-a1.ts'
import { iso18265TableB1 } from '../tables/iso18265-table-b1.ts'
import { iso18265TableB2 } from '../tables/iso18265-table-b2.ts'
import { iso18265TableB3 } from '../tables/iso18265-table-b3.ts'
import { iso18265TableC } from '../tables/iso18265-table-c.ts'
import { iso18265TableD } from '../tables/iso18265-table-d.ts'

export const conversionTableNames = [
  'ASTM E140', 'ISO 18265', 'ISO 18265 A.1', 'ISO 18265 B.1', 'ISO 18265 B.2', 'ISO 18265 B.3', 'ISO 18265 C', 'ISO 18265 D',
] as const
export type ConversionTableName = (typeof conversionTableNames)[number]

/** The tables behind a name, first come first served: where the two of E140 overlap, Table 1 (the HRC range) wins. */
export const conversionTables: Record<ConversionTableName, readonly ConversionTable[]> = {
  'ASTM E140': [e140Table1, e140Table2],
  'ISO 18265': [iso18265TableA1],
  'ISO 18265 A.1': [iso18265TableA1],
  'ISO 18265 B.1': [iso18265TableB1],
  'ISO 18265 B.2': [iso18265TableB2],
  'ISO 18265 B.3': [iso18265TableB3],
  'ISO 18265 C': [iso18265TableC],
  'ISO 18265 D': [iso18265TableD],
}
