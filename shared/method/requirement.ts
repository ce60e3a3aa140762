import * as z from 'zod'

const bound = (label: string) => z.number().min(-1e9).max(1e9).optional().meta({ label })

/** Limits agreed with the customer and the rule by which a result is held against them. */
export const Requirement = z.strictObject({
  limits: z.array(
    z.strictObject({ key: z.string().min(1).max(100).meta({ label: 'Result' }), lower: bound('Lower limit'), upper: bound('Upper limit') })
      .refine(({ lower, upper }) => lower !== undefined || upper !== undefined, 'a limit needs a lower or an upper value')
      .refine(({ lower, upper }) => lower === undefined || upper === undefined || lower <= upper, 'the lower limit lies above the upper limit'),
  ).min(1).max(100).meta({ label: 'Limits' }),
  rule: z.enum(['simple', 'guarded']).meta({ label: 'Decision rule', choices: { simple: 'Simple acceptance', guarded: 'Guarded by the expanded uncertainty' } }),
})
export type Requirement = z.infer<typeof Requirement>
