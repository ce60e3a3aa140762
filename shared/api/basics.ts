import * as z from 'zod'

export const Id = z.uuid()
/** An instant, ISO 8601 with its offset. */
export const Instant = z.iso.datetime({ offset: true })
/** A calendar day, ISO 8601. */
export const Day = z.iso.date()
/** The version of a record that a person saw; a change names it. */
export const Version = z.int().min(0)
export const Text = (max: number) => z.string().trim().min(1).max(max)
export const OptionalText = (max: number) => z.string().trim().max(max).default('')
/** Money in the smallest unit of its currency. */
export const Money = z.int().min(-1_000_000_000_000).max(1_000_000_000_000)
export const Email = z.email('has to be an address like name@company.example').max(254).transform((value) => value.toLowerCase())
/** 12 to 128 of any characters; what is common or guessable is refused by the server. */
export const Password = z.string().min(12, 'at least 12 characters').max(128, 'at most 128 characters')

/** Part of a list and where the next part begins; `next` is null at the end. */
export const page = <T extends z.ZodType>(item: T) => z.strictObject({ items: z.array(item), next: z.string().nullable() })
export const PageQuery = { after: z.string().max(200).optional(), limit: z.coerce.number().int().min(1).max(200).default(50) }
/** Of a list whose parts begin after an id. */
export const PageById = { ...PageQuery, after: Id.optional() }

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
