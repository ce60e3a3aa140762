import * as z from 'zod'

/** Sizes that a test piece can have, mm. Wider limits would let a number typed in the wrong unit pass. */
const Diameter = z.number().min(0.02).max(500).meta({ label: 'Diameter', unit: 'mm', step: 0.001 })
const Thickness = z.number().min(0.005).max(500).meta({ label: 'Thickness', unit: 'mm', step: 0.001 })
const Width = z.number().min(0.05).max(2000).meta({ label: 'Width', unit: 'mm', step: 0.001 })
const GaugeLength = z.number().min(0.5).max(2000)
const Stress = z.number().min(-50).max(10_000)

export const Section = z.discriminatedUnion('shape', [
  z.strictObject({ shape: z.literal('round'), diametersMm: z.array(Diameter).min(1).max(20).meta({ label: 'Diameters', unit: 'mm' }) }),
  z.strictObject({
    shape: z.literal('rectangular'),
    thicknessesMm: z.array(Thickness).min(1).max(20).meta({ label: 'Thicknesses', unit: 'mm' }),
    widthsMm: z.array(Width).min(1).max(20).meta({ label: 'Widths', unit: 'mm' }),
  }),
  z.strictObject({ shape: z.literal('area'), areaMm2: z.number().min(0.0003).max(1_000_000).meta({ label: 'Area', unit: 'mm²', step: 0.01 }) }),
])
export type Section = z.infer<typeof Section>

export const ElasticWindow = z
  .strictObject({ fromMPa: Stress.meta({ label: 'From', unit: 'MPa', step: 10 }), toMPa: Stress.meta({ label: 'To', unit: 'MPa', step: 10 }) })
  .refine(({ fromMPa, toMPa }) => fromMPa < toMPa, { path: ['toMPa'], message: 'must be above the lower end of the elastic stretch' })
export type ElasticWindow = z.infer<typeof ElasticWindow>

export const tensileStandards = ['ISO 6892-1', 'ASTM E8/E8M'] as const

export const TensileParameters = z.strictObject({
  standard: z.enum(tensileStandards).meta({ label: 'Standard' }),
  section: Section.meta({ label: 'Test piece' }),
  originalGaugeLengthMm: GaugeLength.optional().meta({ label: 'Original gauge length L0', unit: 'mm', step: 0.1 }),
  extensometerGaugeLengthMm: GaugeLength.optional().meta({ label: 'Extensometer gauge length Le', unit: 'mm', step: 0.1 }),
  offsetPercent: z.number().min(0.001).max(5).default(0.2).meta({ label: 'Offset of the proof strength', unit: '%', step: 0.05 }),
  elasticWindow: ElasticWindow.optional().meta({ label: 'Elastic stretch' }),
})
export type TensileParameters = z.infer<typeof TensileParameters>
