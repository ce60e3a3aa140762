import * as z from 'zod'

/** What a bench can do: a kind of step, with the least and greatest of each number it takes. */
export const BenchAbility = z.strictObject({ kind: z.string(), limits: z.record(z.string(), z.tuple([z.number(), z.number()])) })
export type BenchAbility = z.infer<typeof BenchAbility>

const clock = z.string().regex(/^([01]\d|2[0-3]):[0-5]\d$/, 'a time of day such as 08:00')
/** Opening hours by weekday, 1 Monday to 7 Sunday, in the site's own time; a day that is missing is shut. */
export const WeekHours = z.array(z.strictObject({ weekday: z.int().min(1).max(7), from: clock, to: clock }))
export type WeekHours = z.infer<typeof WeekHours>

/** Monday to Friday, half past seven to five. */
export const usualHours: WeekHours = [1, 2, 3, 4, 5].map((weekday) => ({ weekday, from: '07:30', to: '17:00' }))
