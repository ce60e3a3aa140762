import * as z from 'zod'
import { Order, OrderColumn, OrderSample } from '../../../../shared/api/orders.ts'
import type { DraftState } from './draft-state.ts'

/** What this browser keeps of a draft until the server has it. */
const Kept = z.object({
  version: z.int(), at: z.number(),
  state: z.object({
    head: Order.omit({ columns: true, samples: true }), columns: z.array(OrderColumn),
    rows: z.array(z.object({ id: z.string(), sample: OrderSample, unread: z.object({ form: z.string().optional(), size: z.string().optional() }), size: z.string().optional() })),
  }),
})
export type KeptDraft = { version: number; at: number; state: DraftState }

const place = (jobId: string) => `crosshead.draft.${jobId}`

/** What was typed here and has not reached the server; undefined when there is nothing, or nothing readable. */
export function keptDraft(jobId: string): KeptDraft | undefined {
  try {
    const text = localStorage.getItem(place(jobId))
    return text ? Kept.safeParse(JSON.parse(text)).data : undefined
  } catch {
    return undefined
  }
}

/** Keeps the draft on this device. False where the browser keeps nothing. */
export function keepDraft(jobId: string, kept: KeptDraft): boolean {
  try {
    localStorage.setItem(place(jobId), JSON.stringify(kept))
    return true
  } catch {
    return false
  }
}

export function forgetDraft(jobId: string): void {
  try {
    localStorage.removeItem(place(jobId))
  } catch {
    // a browser that keeps nothing has nothing to forget
  }
}
