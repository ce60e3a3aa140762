import * as z from 'zod'
import { Id, Instant } from './basics.ts'

/** One node of the traveller line, as screens and paper draw it. */
export const TravellerNode = z.object({
  kind: z.enum(['end', 'prep', 'test', 'review', 'report']),
  /** The stage that gives the node its temper colour. */
  stage: z.enum(['placed', 'awaiting samples', 'in work', 'in review', 'reported', 'closed']),
  label: z.string(),
  state: z.enum(['todo', 'now', 'done', 'part', 'held', 'void', 'back']),
  /** Share of samples that are past this node, 0 to 1, where many share one line. */
  part: z.number().min(0).max(1).optional(),
  /** When it was done, or is planned. */
  at: Instant.nullable().optional(),
  place: z.string().nullable().optional(),
  stepId: Id.optional(),
})
export type TravellerNode = z.infer<typeof TravellerNode>
export const Traveller = z.array(TravellerNode)
export type Traveller = z.infer<typeof Traveller>
