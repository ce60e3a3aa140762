import * as z from 'zod'

/** Why a step stands where it stands: a sentence on the choice, and at most five benches that lost, the nearest first. */
export const Why = z.strictObject({
  chosen: z.string(),
  rejected: z.array(z.strictObject({ bench: z.string(), because: z.string() })).max(5),
})
export type Why = z.infer<typeof Why>

/** One step on a bench, `[start, end)`. Started and done steps carry no `why`: nobody chose for them. */
export const Entry = z.strictObject({
  step: z.string(),
  bench: z.string(),
  person: z.string().nullable(),
  start: z.int(),
  end: z.int(),
  why: Why.optional(),
})
export type Entry = z.infer<typeof Entry>

/** One leg of a sample's way by courier. */
export const Transfer = z.strictObject({ sample: z.string(), from: z.string(), to: z.string(), depart: z.int(), arrive: z.int() })
export type Transfer = z.infer<typeof Transfer>

export const Unplaced = z.strictObject({ step: z.string(), because: z.string(), cures: z.array(z.string()) })
export type Unplaced = z.infer<typeof Unplaced>

/** The promise for a job; `finish` is null for a job without steps. */
export const JobFinish = z.strictObject({ id: z.string(), finish: z.int().nullable(), tardiness: z.int() })
export type JobFinish = z.infer<typeof JobFinish>

export const Totals = z.strictObject({
  weightedTardiness: z.number(),
  transfers: z.int(),
  loadSpread: z.number(),
  lowerBound: z.number(),
})
export type Totals = z.infer<typeof Totals>

export const Plan = z.strictObject({
  entries: z.array(Entry),
  transfers: z.array(Transfer),
  unplaced: z.array(Unplaced),
  jobs: z.array(JobFinish),
  totals: Totals,
})
export type Plan = z.infer<typeof Plan>
