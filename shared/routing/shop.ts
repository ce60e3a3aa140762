import * as z from 'zod'

const Minute = z.int().meta({ label: 'Time', unit: 'min' })
const Minutes = z.int().min(0, 'must be 0 or more').meta({ label: 'Length', unit: 'min' })
const Id = z.string()

/** `[from, to)` in whole minutes from the common origin. */
const Interval = z.tuple([Minute, Minute]).refine(([from, to]) => from < to, 'an interval must end after it begins')

/** Intervals in order that do not touch: two that touch would be one, and a step may run across the joint. */
const Open = z.array(Interval).superRefine((open, context) => {
  for (let i = 1; i < open.length; i++) {
    const [before, here] = [open[i - 1], open[i]]
    if (before && here && here[0] <= before[1]) {
      context.addIssue({ code: 'custom', path: [i], message: 'open intervals must be in order and must not touch' })
    }
  }
})

const Limit = z.tuple([z.number(), z.number()]).refine(([low, high]) => low <= high, 'the lower limit must not be above the upper one')

export const Site = z.strictObject({
  id: Id,
  scope: z.array(z.string()),
  courier: z.array(z.strictObject({ to: Id, departures: z.array(Minute), minutes: Minutes })),
})
export type Site = z.infer<typeof Site>

export const Bench = z.strictObject({
  id: Id,
  site: Id,
  units: z.int().min(1, 'must be 1 or more'),
  open: Open,
  does: z.array(z.strictObject({ kind: z.string(), limits: z.record(z.string(), Limit) })),
  usableUntil: Minute,
  out: z.boolean(),
})
export type Bench = z.infer<typeof Bench>

export const Person = z.strictObject({
  id: Id,
  site: Id,
  open: Open,
  may: z.array(z.strictObject({ kind: z.string(), until: Minute })),
})
export type Person = z.infer<typeof Person>

export const Step = z.strictObject({
  id: Id,
  sample: Id,
  kind: z.string(),
  after: z.array(Id),
  setupMinutes: Minutes,
  runMinutes: Minutes,
  attended: z.enum(['all', 'setup', 'none']),
  needs: z.record(z.string(), z.number()),
  scope: z.string().nullable(),
  pin: z.strictObject({ bench: Id.optional(), person: Id.nullable().optional(), start: Minute.optional() }).optional(),
  previous: z.strictObject({ bench: Id, person: Id.nullable(), start: Minute }).optional(),
  state: z.enum(['started', 'done']).optional(),
  actual: z.strictObject({ bench: Id, person: Id.nullable(), start: Minute, end: Minute.optional() }).optional(),
})
export type Step = z.infer<typeof Step>

/** One lab network at one moment: what is to be planned and what may be used for it. All times are whole minutes from a common origin. */
export const Shop = z.strictObject({
  now: Minute,
  frozenMinutes: Minutes,
  horizon: Minute,
  effort: z.int().min(0, 'must be 0 or more'),
  sites: z.array(Site),
  benches: z.array(Bench),
  people: z.array(Person),
  jobs: z.array(z.strictObject({ id: Id, due: Minute, weight: z.number().min(0, 'must be 0 or more') })),
  samples: z.array(z.strictObject({ id: Id, job: Id, site: Id, availableFrom: Minute })),
  steps: z.array(Step),
})
export type Shop = z.infer<typeof Shop>
