import type * as z from 'zod'
import type { outside } from '../server/integrations/outside.ts'
import type { EventType } from '../shared/events.ts'

type Outside = ReturnType<typeof outside>

/** What a task is told: the event's data, what it happened to, and its number in the ledger. */
export type Told = Record<string, unknown> & { eventId: number; subjectId: string }

/**
 * Background work that follows from events. `run` may happen twice, at once or after a crash: it claims the work with a
 * conditional update or a unique row. `payload` is checked against the event's data with `subjectId`, `jobId`,
 * `customerId`, `siteId` and `eventId` added.
 */
export type Task = { name: string; on: readonly EventType[]; attempts: number; run: (told: Told, services: Outside) => Promise<void> }

export function task<P extends z.ZodType>(definition: {
  name: string
  on: readonly EventType[]
  payload: P
  attempts: number
  run: (payload: z.infer<P>, services: Outside) => Promise<void>
}): Task {
  const { payload, run, ...rest } = definition
  return { ...rest, run: (told, services) => run(payload.parse(told), services) }
}
