import { barredFrom, type Bar } from '../layout/barred-from.ts'
import type { Layout } from '../layout/layout.ts'

/** For each bench that does the step's kind (by index), the rule that keeps the step from it at any time. */
export function benchBars({ shop, steps, benchSites }: Layout, i: number): { bench: number; bar: Bar }[] {
  const { step, earliest } = steps[i]!
  return shop.benches.flatMap((bench, index) => {
    if (!bench.does.some(({ kind }) => kind === step.kind)) return []
    const crew = step.attended === 'none' ? null : shop.people
      .filter(({ id, site }) => site === bench.site && (step.pin?.person == null || step.pin.person === id))
      .flatMap(({ may }) => may.filter(({ kind }) => kind === step.kind).map(({ until }) => until))
    const bar = barredFrom(step, bench, shop.sites[benchSites[index]!]?.scope ?? [], earliest, crew)
    return bar ? [{ bench: index, bar }] : []
  })
}
