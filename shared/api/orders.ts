import * as z from 'zod'
import { Piece } from '../method/piece.ts'
import { Day, Id, Instant, Money, OptionalText } from './basics.ts'
import { Currency } from './words.ts'

export const Requirement = z.strictObject({
  limits: z.array(z.strictObject({ key: z.string().max(60), lower: z.number().optional(), upper: z.number().optional() })
    .refine(({ lower, upper }) => lower !== undefined || upper !== undefined, 'give a lower or an upper limit')
    .refine(({ lower, upper }) => lower === undefined || upper === undefined || lower <= upper, 'the lower limit must not be above the upper'),
  ).max(20),
  rule: z.enum(['simple', 'guarded']),
})
export type Requirement = z.infer<typeof Requirement>

const ColumnKey = z.string().regex(/^[a-z0-9]{1,12}$/)
/** A test as a column of the order: one method with its parameters, ticked for some samples. */
export const OrderColumn = z.strictObject({
  key: ColumnKey, methodId: z.string().max(60), parameters: z.record(z.string().max(60), z.unknown()), requirement: Requirement.nullable(),
})
export type OrderColumn = z.infer<typeof OrderColumn>

export const OrderSample = z.strictObject({
  heat: OptionalText(60), lot: OptionalText(60), material: OptionalText(100), piece: Piece,
  tests: z.array(ColumnKey).max(20),
  /** Parameters that differ from the column's for this sample alone. */
  overrides: z.record(ColumnKey, z.record(z.string().max(60), z.unknown())).default({}),
})
export type OrderSample = z.infer<typeof OrderSample>

export const afterwardsChoices = ['keep 30 days, then return', 'return at once', 'keep 30 days, then dispose'] as const

/** What a client orders, while it is typed and as it was placed. */
export const Order = z.strictObject({
  purchaseOrder: OptionalText(60), neededBy: Day.nullable(), afterwards: z.enum(afterwardsChoices),
  siteId: Id.nullable(), columns: z.array(OrderColumn).max(12), samples: z.array(OrderSample).max(500),
})
export type Order = z.infer<typeof Order>

/** Something in the order that has to be put right first, or that a method cannot take. Rows and columns count from 0. */
export const OrderFault = z.object({
  row: z.int().nullable(), column: z.string().nullable(), field: z.string(), message: z.string(),
  cures: z.array(z.object({ label: z.string(), parameters: z.record(z.string(), z.unknown()) })),
})
export type OrderFault = z.infer<typeof OrderFault>

/** Price and promise of an order. `rowMinor` are the samples' own prices, in order. */
export const Quote = z.object({
  lines: z.array(z.object({ name: z.string(), count: z.int(), unitMinor: Money, totalMinor: Money })),
  rowMinor: z.array(Money), netMinor: Money, taxPercent: z.number(), taxMinor: Money, totalMinor: Money, currency: Currency,
  faults: z.array(OrderFault),
  sites: z.array(z.object({ siteId: Id, name: z.string(), finish: Instant.nullable(), because: z.string() })),
  promise: z.object({ siteId: Id, siteName: z.string(), finish: Instant, receiveBy: Instant }).nullable(),
})
export type Quote = z.infer<typeof Quote>
