import * as z from 'zod'

/**
 * What happens to the next messages:
 * - `refuse`: 550, for good
 * - `try-later`: 451, nothing kept
 * - `delay`: taken after `delayMs`
 * - `lose-answer`: kept, but the sender is told of a failure
 */
export const mailFaultKinds = ['refuse', 'try-later', 'delay', 'lose-answer'] as const

export const MailFault = z.strictObject({
  how: z.enum(mailFaultKinds),
  times: z.coerce.number().int().min(1).max(100).default(1),
  delayMs: z.coerce.number().int().min(0).max(600_000).default(2000),
})
export type MailFault = z.infer<typeof MailFault>

export type MailFaults = ReturnType<typeof createMailFaults>

/** The faults that are still to come, in the order they were asked for. */
export function createMailFaults() {
  const planned: MailFault[] = []
  return {
    add: (fault: z.input<typeof MailFault>) => void planned.push(MailFault.parse(fault)),
    planned: (): readonly MailFault[] => planned,
    clear: () => void planned.splice(0),
    take: (): MailFault | undefined => {
      const fault = planned[0]
      if (fault) fault.times -= 1
      if (fault?.times === 0) planned.shift()
      return fault
    },
  }
}
