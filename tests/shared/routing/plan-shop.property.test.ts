import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { planInput } from '../../../shared/routing/plan-input.ts'
import { Plan } from '../../../shared/routing/plan.ts'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import { checkPlan } from './check-plan.ts'
import { randomShop } from './random-shop.ts'

const bounded = { interruptAfterTimeLimit: 60_000, markInterruptAsFailure: true, endOnFailure: true }

describe('a plan of any shop', () => {
  it('keeps every hard rule', () => {
    let placed = 0
    fc.assert(fc.property(randomShop, (shop) => {
      const plan = planInput(shop)
      if ('error' in plan) throw new Error(JSON.stringify(plan.error))
      Plan.parse(plan)
      placed += plan.entries.length
      expect(checkPlan(shop, plan)).toEqual([])
    }), { numRuns: 1000, ...bounded })
    // A planner that placed nothing would keep every rule too.
    expect(placed).toBeGreaterThan(2000)
  }, 90_000)

  it('is the same, byte for byte, when planned again', () => {
    fc.assert(fc.property(randomShop, (shop) => {
      expect(JSON.stringify(planShop(structuredClone(shop)))).toBe(JSON.stringify(planShop(shop)))
    }), { numRuns: 100, ...bounded })
  }, 60_000)

  it('leaves in place what it planned into the frozen window before', () => {
    fc.assert(fc.property(randomShop, (shop) => {
      const first = planShop(shop)
      const again = planShop({
        ...shop, frozenMinutes: 100_000,
        steps: shop.steps.map((step) => {
          const entry = first.entries.find((each) => each.step === step.id)
          return entry && !step.state ? { ...step, previous: { bench: entry.bench, person: entry.person, start: entry.start } } : step
        }),
      })
      const placement = ({ step, bench, person, start, end }: Plan['entries'][number]) => ({ step, bench, person, start, end })
      for (const entry of first.entries) expect(again.entries.map(placement)).toContainEqual(placement(entry))
    }), { numRuns: 200, ...bounded })
  }, 60_000)
})
