import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { round } from '../units/round.ts'
import { conversionScales, type ConversionScale } from './conversion/conversion-scale.ts'
import { readTable, type ConversionTable } from './conversion/conversion-table.ts'
import { conversionTableNames, conversionTables } from './conversion/conversion-tables.ts'

/**
 * Converts a measured hardness by a published table. Every answer is approximate; it holds for the table's material only, is never
 * chained through a third scale and never extrapolated. ASTM E140 has the strength of ASTM A370 beside it.
 */
export const convertHardness = defineTool({
  id: 'convert-hardness',
  title: 'Convert hardness',
  input: z.strictObject({
    material: z.literal('non-austenitic steel').meta({ label: 'Material' }),
    table: z.enum(conversionTableNames).meta({ label: 'Table' }),
    from: z.strictObject({
      scale: z.enum(conversionScales).meta({ label: 'Measured scale' }),
      value: z.number().min(-1000).max(100_000).meta({ label: 'Measured value' }),
    }).meta({ label: 'From' }),
    to: z.array(z.enum(conversionScales)).min(1).max(100).meta({ label: 'To' }),
  }),
  run: ({ table, from, to }) => ({
    values: to.map((scale) => {
      const { value, informative, reported } = convert(conversionTables[table], table, from, scale)
      return { scale, value, reported, informative }
    }),
    approximate: true,
  }),
})

function convert(tables: readonly ConversionTable[], name: string, from: { scale: ConversionScale; value: number }, to: ConversionScale) {
  for (const table of tables) {
    const reading = readTable(table, from.scale, from.value, to)
    if (reading) return { ...reading, reported: converted(reading.value, to, table) }
  }
  throw new RangeError(`${name} has no ${said(to)} for ${from.value} ${said(from.scale)}`)
}

function converted(value: number, scale: ConversionScale, { reporting }: ConversionTable): string {
  return `${round(value, reporting === 'tenths' && scale.startsWith('HR') ? '0.1' : '1')} ${said(scale)}`
}

function said(scale: ConversionScale): string {
  return scale === 'tensileStrengthMPa' ? 'MPa' : scale
}
