import * as z from 'zod'

/**
 * The parameters as ordered: those measured at the bench may still be missing, and rules that span several parameters wait
 * for them. A schema that is no plain object has nothing to leave out and is returned as it is.
 */
export function orderedParameters(parameters: z.ZodType, measured: readonly string[]): z.ZodType {
  if (!(parameters instanceof z.ZodObject) || measured.length === 0) return parameters
  const shape = Object.entries<z.core.SomeType>(parameters.shape)
  return z.strictObject(Object.fromEntries(shape.map(([key, schema]) => [key, measured.includes(key) ? z.optional(schema) : schema])))
}
