/** Indexes of steps, each after all that it waits for; otherwise in the order given. The steps must not wait in a circle. */
export function orderSteps(steps: { before: number[]; after: number[] }[]): number[] {
  const open = steps.map(({ before }) => before.length)
  const order = steps.flatMap((_, i) => (open[i] === 0 ? [i] : []))
  for (let at = 0; at < order.length; at++) {
    for (const after of steps[order[at]!]!.after) if (--open[after]! === 0) order.push(after)
  }
  return order
}
