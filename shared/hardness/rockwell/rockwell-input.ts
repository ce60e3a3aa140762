import * as z from 'zod'
import { rockwellStandards } from './rockwell-rules.ts'
import { rockwellScales } from './rockwell-scale.ts'

const place = (label: string) => z.number().min(-10_000).max(10_000).optional().meta({ label, unit: 'mm', step: 0.01 })

export const RockwellParameters = z.strictObject({
  standard: z.enum(rockwellStandards).meta({ label: 'Standard' }),
  scale: z.enum(rockwellScales).meta({ label: 'Scale' }),
  surface: z.discriminatedUnion('shape', [
    z.strictObject({ shape: z.literal('flat').meta({ label: 'Flat' }) }),
    z.strictObject({
      shape: z.literal('cylinder').meta({ label: 'Convex cylinder' }),
      diameterMm: z.number().positive().max(10_000).meta({ label: 'Diameter', unit: 'mm', step: 0.1 }),
    }),
  ]).meta({ label: 'Surface' }),
  thicknessMm: z.number().positive().max(10_000).optional().meta({ label: 'Thickness at the test surface', unit: 'mm', step: 0.01 }),
})
export type RockwellParameters = z.infer<typeof RockwellParameters>

const RockwellReading = z.strictObject({
  value: z.number().min(0).max(130).meta({ label: 'Reading', unit: 'HR', step: 0.1 }),
  xMm: place('Across (x)'),
  yMm: place('Along (y)'),
  edgeMm: z.number().min(0).max(10_000).optional().meta({ label: 'Centre to edge', unit: 'mm', step: 0.01 }),
})
export type RockwellReading = z.infer<typeof RockwellReading>

export const RockwellReadings = z.array(RockwellReading).min(1).max(10_000).meta({ label: 'Readings' })
