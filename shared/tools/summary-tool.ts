import * as z from 'zod'
import { defineTool } from '../method/define-tool.ts'
import { lag1Autocorrelation } from '../statistics/lag1-autocorrelation.ts'
import { mean } from '../statistics/mean.ts'
import { standardDeviation } from '../statistics/standard-deviation.ts'

/** Count, mean and scatter of a list. One value has no standard deviation; a list without scatter has no autocorrelation. */
export const summaryTool = defineTool({
  id: 'summary',
  title: 'Summary of values',
  input: z.strictObject({ values: z.array(z.number().min(-1e100).max(1e100)).min(1).max(2_000_000).meta({ label: 'Values' }) }),
  run: ({ values }) => {
    const correlation = lag1Autocorrelation(values)
    return {
      count: values.length,
      mean: mean(values),
      ...(values.length > 1 && { standardDeviation: standardDeviation(values) }),
      ...(correlation !== undefined && { lag1Autocorrelation: correlation }),
    }
  },
})
