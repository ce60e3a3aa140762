import { stateTemper, type StateName } from './state.tsx'
import { temperRow } from './temper.ts'

/** Six cells filled up to the state: length beside colour. The state's name has to stand beside it. */
export function Heat({ state }: { state: StateName }) {
  const temper = stateTemper(state)
  const reached = temper ? temperRow.indexOf(temper) : -1
  return (
    <span className="inline-flex gap-0.5" aria-hidden>
      {temperRow.map((cell, place) => (
        <i key={cell} className={`c-${cell} h-3 w-2.25 border ${place <= reached ? 'border-(--ce) bg-(--c)' : 'border-edge'}`} />
      ))}
    </span>
  )
}
