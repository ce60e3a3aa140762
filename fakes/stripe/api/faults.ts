import * as z from 'zod'

/**
 * How the next calls of the API go wrong:
 * - `rate-limit`: 429, nothing done
 * - `server-error`: 500, nothing done
 * - `timeout`: the work is done, the answer never comes
 * - `cut`: the work is done, the connection is cut before the answer
 */
export const faultKinds = ['rate-limit', 'server-error', 'timeout', 'cut'] as const

export const Fault = z.strictObject({
  how: z.enum(faultKinds),
  times: z.coerce.number().int().min(1).max(100).default(1),
  /** Only calls whose path begins like this, such as `/v1/refunds`. */
  path: z.string().default('/v1/'),
})
export type Fault = z.infer<typeof Fault>

export type Faults = ReturnType<typeof createFaults>

/** The faults that are still to come, in the order they were asked for. */
export function createFaults() {
  const planned: Fault[] = []
  return {
    add: (fault: z.input<typeof Fault>) => void planned.push(Fault.parse(fault)),
    planned: (): readonly Fault[] => planned,
    clear: () => void planned.splice(0),
    /** Takes the fault that hits this call, if any. */
    take(path: string): Fault['how'] | undefined {
      const fault = planned.find((next) => path.startsWith(next.path))
      if (!fault) return undefined
      fault.times -= 1
      if (fault.times === 0) planned.splice(planned.indexOf(fault), 1)
      return fault.how
    },
  }
}
