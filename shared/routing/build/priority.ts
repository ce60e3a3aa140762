import type { Layout } from '../layout/layout.ts'

/** What a step's weight is set against: its own length, the longest way to the end of its job, or all the work left in the job. */
export type Rule = { against: 'step' | 'rest' | 'job'; k: number }

/** Settings of the rule to try, the best first on the whole. Small shops try all, large ones the first few. */
export const rules: Rule[] = [
  { against: 'rest', k: 2 }, { against: 'job', k: 2 }, { against: 'step', k: 2 }, { against: 'job', k: 0.7 },
  { against: 'rest', k: 5 }, { against: 'step', k: 0.7 }, { against: 'job', k: 5 }, { against: 'rest', k: 0.7 },
]

/**
 * Apparent tardiness cost (Vepsalainen and Morton, 1987): the index of a step at time t, the greater the sooner it should go.
 *
 *   index = ln( w / p ) - max(0, due - tail - p_step - t) / (k * mean length)
 *
 * w: the weight of its job; p: minutes it is set against (see `Rule`); due - tail: when the step must end for its job to be in time.
 * The logarithm leaves the order of the classic w / p * exp(-slack / (k * mean)) and can't run out of range.
 * A step that others of another job wait for takes the tighter due time and the greater weight.
 * Example: w 2, p 50, no slack: ln 0.04 = -3.22.
 */
export function priority(layout: Layout, rule: Rule): (step: number, time: number) => number {
  const { steps, order, shop } = layout
  const open = order.filter((i) => !steps[i]!.fixed)
  const mean = open.reduce((sum, i) => sum + steps[i]!.length, 0) / Math.max(1, open.length)
  const scale = Math.max(1, rule.k * mean)
  const work = shop.jobs.map(() => 0)
  for (const i of open) work[steps[i]!.job]! += steps[i]!.length

  const latestStart = new Float64Array(steps.length)
  const gain = new Float64Array(steps.length)
  const rest = new Float64Array(steps.length)
  const weight = new Float64Array(steps.length)
  for (let at = order.length - 1; at >= 0; at--) {
    const i = order[at]!
    const { job, length, after } = steps[i]!
    let due = shop.jobs[job]!.due
    let tail = 0
    weight[i] = shop.jobs[job]!.weight
    for (const next of after) {
      due = Math.min(due, latestStart[next]!)
      tail = Math.max(tail, rest[next]!)
      weight[i] = Math.max(weight[i], weight[next]!)
    }
    latestStart[i] = due - length
    rest[i] = tail + length
    const against = rule.against === 'step' ? length : rule.against === 'rest' ? rest[i] : work[job]!
    gain[i] = Math.log(Math.max(weight[i], 1e-9) / Math.max(1, against))
  }
  return (step, time) => gain[step]! - Math.max(0, latestStart[step]! - time) / scale
}
