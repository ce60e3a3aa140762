import type * as z from 'zod'

/** A calculation that is no method: it has no readings, no standard's rules for a run and nothing to report. */
export type Tool = {
  id: string
  title: string
  input: z.ZodType
  /** Checks raw input and calculates. Throws ZodError for input that cannot be read, RangeError where there is no answer. */
  run(input: unknown): Record<string, unknown>
}

/** Makes a tool out of a typed definition; the result hides its types, so that all tools share one list. */
export function defineTool<I>(definition: { id: string; title: string; input: z.ZodType<I>; run(input: I): Record<string, unknown> }): Tool {
  const { id, title, input } = definition
  return { id, title, input, run: (raw) => definition.run(input.parse(raw)) }
}
