import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { conformity } from '../statistics/conformity.ts'

const bound = (label: string) => z.number().min(-1e100).max(1e100).optional().meta({ label })

/** Holds one value against limits by a decision rule. */
export const conformityTool = defineTool({
  id: 'conformity',
  title: 'Decide conformity',
  input: z.strictObject({
    value: z.number().min(-1e100).max(1e100).meta({ label: 'Value' }),
    expandedUncertainty: z.number().nonnegative().max(1e100).meta({ label: 'Expanded uncertainty' }),
    coverageFactor: z.number().positive().max(1000).default(2).meta({ label: 'Coverage factor' }),
    lower: bound('Lower limit'),
    upper: bound('Upper limit'),
    rule: z.enum(['simple', 'guarded']).meta({ label: 'Decision rule' }),
  }).refine(({ lower, upper }) => lower !== undefined || upper !== undefined, { path: ['lower'], message: 'a lower or an upper limit is needed' })
    .refine(({ lower, upper }) => lower === undefined || upper === undefined || lower <= upper, { path: ['lower'], message: 'lies above the upper limit' }),
  run: (input) => ({ ...conformity(input) }),
})
