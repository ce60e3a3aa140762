import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { conversionScales } from './conversion/conversion-scale.ts'
import { conversionTableNames } from './conversion/conversion-tables.ts'
import { convertByTable, scaleSaid } from './conversion/convert-by-table.ts'

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
      const converted = convertByTable(table, from, scale)
      if (!converted) throw new RangeError(`${table} has no ${scaleSaid(scale)} for ${from.value} ${scaleSaid(from.scale)}`)
      return converted
    }),
    approximate: true,
  }),
})
