import { checkShop, type ShopIssue } from './check-shop.ts'
import type { Plan } from './plan.ts'
import { planShop } from './plan-shop.ts'
import { Shop } from './shop.ts'

export type PlanError = { error: { code: 'invalid-input'; issues: ShopIssue[] } }

/** The plan of one shop from outside, or what is wrong with it. */
export function planInput(input: unknown): Plan | PlanError {
  const read = Shop.safeParse(input)
  if (!read.success) return refuse(read.error.issues.map((issue) => ({ path: issue.path.map(segment), message: issue.message })))
  const issues = checkShop(read.data)
  return issues.length ? refuse(issues) : planShop(read.data)
}

const segment = (part: PropertyKey) => (typeof part === 'symbol' ? part.toString() : part)
const refuse = (issues: ShopIssue[]): PlanError => ({ error: { code: 'invalid-input', issues } })
