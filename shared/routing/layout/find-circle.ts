type Waiting = { id: string; after: string[] }

/** A circle of steps that wait for one another, in order, or null. Unknown references are skipped; no recursion, so that chains may be long. */
export function findCircle(steps: Waiting[]): { at: number; steps: string[] } | null {
  const index = new Map(steps.map((step, i) => [step.id, i]))
  const state = new Uint8Array(steps.length)
  for (let root = 0; root < steps.length; root++) {
    if (state[root]) continue
    const path: { at: number; next: number }[] = [{ at: root, next: 0 }]
    state[root] = 1
    while (path.length) {
      const top = path[path.length - 1]!
      const step = steps[top.at]!
      const id = step.after[top.next++]
      if (id === undefined) {
        state[top.at] = 2
        path.pop()
        continue
      }
      const before = index.get(id)
      if (before === undefined || state[before] === 2) continue
      if (state[before] === 1) {
        const circle = path.slice(path.findIndex((each) => each.at === before))
        return { at: before, steps: circle.map((each) => steps[each.at]!.id) }
      }
      state[before] = 1
      path.push({ at: before, next: 0 })
    }
  }
  return null
}
