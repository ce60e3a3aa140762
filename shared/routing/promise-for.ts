import { planShop } from './plan-shop.ts'
import type { Shop } from './shop.ts'

/**
 * What may be promised for a job: its planned finish and the minutes left until it is due (negative: late).
 * Both null for a job without steps. Throws `RangeError` for a job that the shop does not have.
 */
export function promiseFor(shop: Shop, jobId: string): { finish: number | null; slack: number | null } {
  const job = shop.jobs.find(({ id }) => id === jobId)
  if (!job) throw new RangeError(`the shop has no job '${jobId}'`)
  const finish = planShop(shop).jobs.find(({ id }) => id === jobId)?.finish ?? null
  return { finish, slack: finish === null ? null : job.due - finish }
}
