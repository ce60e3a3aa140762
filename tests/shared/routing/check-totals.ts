import type { Plan } from '../../../shared/routing/plan.ts'
import type { Shop } from '../../../shared/routing/shop.ts'

/** Where a plan's jobs and totals do not follow from its entries. */
export function findTotalsFaults(shop: Shop, plan: Plan): string[] {
  const faults: string[] = []
  let weighted = 0
  for (const job of shop.jobs) {
    const samples = shop.samples.filter((sample) => sample.job === job.id).map(({ id }) => id)
    const steps = shop.steps.filter(({ sample }) => samples.includes(sample))
    const ends = steps.map((step) => (step.state === 'done' ? step.actual?.end : plan.entries.find((entry) => entry.step === step.id)?.end) ?? shop.horizon)
    const finish = ends.length ? Math.max(...ends) : null
    const tardiness = finish === null ? 0 : Math.max(0, finish - job.due)
    weighted += job.weight * tardiness
    const told = plan.jobs.find(({ id }) => id === job.id)
    if (told?.finish !== finish || told.tardiness !== tardiness) faults.push(`job ${job.id} finishes at ${finish}, ${tardiness} late, not as told`)
  }
  if (plan.jobs.length !== shop.jobs.length) faults.push('jobs are missing or told twice')
  if (Math.abs(weighted - plan.totals.weightedTardiness) > 1e-6) faults.push(`weighted tardiness is ${weighted}`)
  if (plan.totals.transfers !== plan.transfers.length) faults.push('transfers are miscounted')
  if (plan.totals.lowerBound > weighted + 1e-6) faults.push(`the lower bound ${plan.totals.lowerBound} is above ${weighted}`)

  const clip = (from: number, to: number) => Math.max(0, Math.min(to, shop.horizon) - Math.max(from, shop.now))
  const loads = shop.benches.filter(({ out }) => !out).map((bench) => {
    const minutes = bench.open.map(([from, to]) => clip(from, to)).reduce((a, b) => a + b, 0)
    const held = plan.entries.filter((entry) => entry.bench === bench.id).map(({ start, end }) => clip(start, end)).reduce((a, b) => a + b, 0)
    return minutes ? held / bench.units / minutes : 0
  })
  const mean = loads.reduce((a, b) => a + b, 0) / Math.max(1, loads.length)
  const spread = Math.sqrt(loads.map((load) => (load - mean) ** 2).reduce((a, b) => a + b, 0) / Math.max(1, loads.length))
  if (Math.abs(spread - plan.totals.loadSpread) > 0.000051) faults.push(`the spread of load is ${spread}`)
  return faults
}
