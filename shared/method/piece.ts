import * as z from 'zod'

export const productForms = ['bar', 'plate', 'sheet', 'tube', 'wire', 'forging', 'casting'] as const

/** What is known of a sample's shape when it is ordered. Lengths in mm. */
export const Piece = z.strictObject({
  form: z.enum(productForms).meta({ label: 'Form' }),
  diameterMm: z.number().positive().max(2000).optional().meta({ label: 'Diameter', unit: 'mm' }),
  thicknessMm: z.number().positive().max(2000).optional().meta({ label: 'Thickness', unit: 'mm' }),
  widthMm: z.number().positive().max(5000).optional().meta({ label: 'Width', unit: 'mm' }),
})
export type Piece = z.infer<typeof Piece>
