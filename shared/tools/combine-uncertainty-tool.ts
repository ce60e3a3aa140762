import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { combineUncertainty, usualConfidence } from '../statistics/combine-uncertainty.ts'

/** Combined and expanded uncertainty of a budget. */
export const combineUncertaintyTool = defineTool({
  id: 'combine-uncertainty',
  title: 'Combine uncertainties',
  input: z.strictObject({
    components: z.array(z.strictObject({
      standardUncertainty: z.number().nonnegative().max(1e100).meta({ label: 'Standard uncertainty' }),
      sensitivity: z.number().min(-1e100).max(1e100).optional().meta({ label: 'Sensitivity' }),
      degreesOfFreedom: z.number().min(1).max(1e15).optional().meta({ label: 'Degrees of freedom' }),
    })).min(1).max(1000).meta({ label: 'Components' }),
    confidence: z.number().gt(0).lt(1).default(usualConfidence).meta({ label: 'Confidence' }),
  }),
  run: ({ components, confidence }) => ({ ...combineUncertainty(components, confidence) }),
})
