import * as z from 'zod'

/** What was done at the bench and the server does not have yet. `at` is the browser's clock in ms; `key` is the reading's, made here. */
export const Unsent = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('keep'), testRunId: z.string(), key: z.string(), path: z.string(), value: z.unknown(), at: z.number() }),
  z.object({ kind: z.literal('strike'), testRunId: z.string(), key: z.string(), reason: z.string(), at: z.number() }),
])
export type Unsent = z.infer<typeof Unsent>
export type UnsentKeep = Extract<Unsent, { kind: 'keep' }>

/** One name for each thing, so that putting it twice keeps it once. */
export function nameOf({ kind, key }: Pick<Unsent, 'kind' | 'key'>): string {
  return `${kind} ${key}`
}
