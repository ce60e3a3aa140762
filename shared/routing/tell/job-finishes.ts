import type { Bookings } from '../build/bookings.ts'
import type { JobFinish } from '../plan.ts'

/** When each job is done and how late that is. A job with a step that is not placed counts as done at the horizon. */
export function jobFinishes({ layout, placed }: Bookings): JobFinish[] {
  const { shop, steps } = layout
  const finish: (number | null)[] = shop.jobs.map(() => null)
  steps.forEach(({ job }, i) => {
    finish[job] = Math.max(finish[job] ?? -Infinity, placed[i]?.end ?? shop.horizon)
  })
  return shop.jobs.map(({ id, due }, i) => ({ id, finish: finish[i] ?? null, tardiness: Math.max(0, (finish[i] ?? due) - due) }))
}
