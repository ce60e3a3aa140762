/** A plain history: what was, what is, what was undone. */
export type History<S> = { past: readonly S[]; now: S; future: readonly S[]; /** Changes with the same mark are one step: typing in one cell. */ mark: string | null }

const longest = 200

export function began<S>(now: S): History<S> {
  return { past: [], now, future: [], mark: null }
}
export function changed<S>(history: History<S>, now: S, mark: string | null = null): History<S> {
  if (now === history.now) return history
  const goesOn = mark !== null && mark === history.mark
  return { past: goesOn ? history.past : [...history.past, history.now].slice(-longest), now, future: [], mark }
}
export function undone<S>(history: History<S>): History<S> {
  const last = history.past.at(-1)
  return last === undefined ? history : { past: history.past.slice(0, -1), now: last, future: [history.now, ...history.future], mark: null }
}
export function redone<S>(history: History<S>): History<S> {
  const [next, ...future] = history.future
  return next === undefined ? history : { past: [...history.past, history.now], now: next, future, mark: null }
}
