import { round } from '../../units/round.ts'
import type { ConversionScale } from './conversion-scale.ts'
import { readTable, type ConversionTable } from './conversion-table.ts'
import { conversionTables, type ConversionTableName } from './conversion-tables.ts'

export type Converted = { scale: ConversionScale; value: number; reported: string; informative: boolean }

/**
 * One hardness by a published table on another scale, with its reported form: whole numbers under ASTM E140 and A370, Rockwell scales to
 * 0.1 under ISO 18265. Undefined where the table has no answer.
 * @example convertByTable('ASTM E140', { scale: 'HRC', value: 45 }, 'HV')?.reported // '446 HV'
 */
export function convertByTable(name: ConversionTableName, from: { scale: ConversionScale; value: number }, to: ConversionScale): Converted | undefined {
  for (const table of conversionTables[name]) {
    const reading = readTable(table, from.scale, from.value, to)
    if (reading) return { scale: to, value: reading.value, reported: reportedAs(reading.value, to, table), informative: reading.informative }
  }
  return undefined
}

/** A scale as it stands after a number: strengths are in MPa. */
export function scaleSaid(scale: ConversionScale): string {
  return scale === 'tensileStrengthMPa' ? 'MPa' : scale
}

function reportedAs(value: number, scale: ConversionScale, { reporting }: ConversionTable): string {
  return `${round(value, reporting === 'tenths' && scale.startsWith('HR') ? '0.1' : '1')} ${scaleSaid(scale)}`
}
