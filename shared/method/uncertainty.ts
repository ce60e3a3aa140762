import * as z from 'zod'

/** What is known of the uncertainty from elsewhere: certificates, the machine, the reference. In the unit of the method's main result. */
export const Uncertainty = z.strictObject({
  components: z.array(z.strictObject({
    name: z.string().min(1).max(200).meta({ label: 'Source' }),
    standardUncertainty: z.number().nonnegative().max(1e12).meta({ label: 'Standard uncertainty' }),
    sensitivity: z.number().min(-1e12).max(1e12).optional().meta({ label: 'Sensitivity' }),
    degreesOfFreedom: z.number().min(1).max(1e12).optional().meta({ label: 'Degrees of freedom' }),
  })).min(1).max(1000).meta({ label: 'Components' }),
})
export type Uncertainty = z.infer<typeof Uncertainty>
