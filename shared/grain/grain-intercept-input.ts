import * as z from 'zod'
import { grainStandards } from './grain-size-number.ts'

export const GrainInterceptParameters = z.strictObject({
  standard: z.enum(grainStandards).meta({ label: 'Standard' }),
})
export type GrainInterceptParameters = z.infer<typeof GrainInterceptParameters>

const count = (label: string) => z.number().min(0).max(1_000_000).optional().meta({ label, step: 0.5 })

const Field = z.strictObject({
  lineLengthMm: z.number().positive().max(100_000).meta({ label: 'True line length on the specimen', unit: 'mm', step: 0.001 }),
  intersections: count('Boundary intersections'),
  intercepts: count('Grains intercepted'),
}).refine(({ intersections, intercepts }) => (intersections === undefined) !== (intercepts === undefined), 'a field has either intersections or intercepts')

export const GrainInterceptReadings = z.array(Field).min(1).max(10_000)
  .refine((fields) => fields.every((field) => (field.intercepts === undefined) === (fields[0]?.intercepts === undefined)), 'all fields count the same thing: intersections or intercepts')
  .meta({ label: 'Fields' })
export type GrainInterceptReadings = z.infer<typeof GrainInterceptReadings>
