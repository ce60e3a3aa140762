import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { tQuantile } from '../statistics/t-quantile.ts'

/** Quantile of Student's t for a cumulative (one-sided) probability. */
export const tQuantileTool = defineTool({
  id: 't-quantile',
  title: 'Quantile of Student\'s t',
  input: z.strictObject({
    probability: z.number().gt(0).lt(1).meta({ label: 'Cumulative probability' }),
    degreesOfFreedom: z.number().positive().max(1e15).meta({ label: 'Degrees of freedom' }),
  }),
  run: ({ probability, degreesOfFreedom }) => ({ value: tQuantile(probability, degreesOfFreedom) }),
})
