import type { JobState } from '../../../../shared/api/words.ts'
import { formatNumber } from '../../../lib/format.ts'
import { classNames } from '../class-names.ts'
import { stateLabel, stateTemper } from './state.tsx'

/**
 * The row as a filter over a list, with counts. Nothing chosen means all; pressing the chosen one again takes it away.
 * `<TemperScale counts={[{ state: 'placed', count: 3 }, …]} chosen={state} onChoose={setState} />`
 */
export function TemperScale({ counts, chosen, onChoose, label = 'Show only this state' }: {
  counts: readonly { state: JobState; count: number }[]
  chosen?: JobState | undefined
  onChoose: (state: JobState | undefined) => void
  label?: string
}) {
  return (
    <div role="group" aria-label={label} className="mb-6 grid auto-cols-fr grid-flow-col max-list:-mx-gutter max-list:mb-4 max-list:auto-cols-[148px] max-list:overflow-x-auto max-list:px-gutter max-list:[scrollbar-width:none]">
      {counts.map(({ state, count }) => {
        const pressed = state === chosen
        return (
          <button
            key={state}
            type="button"
            aria-pressed={pressed}
            onClick={() => onChoose(pressed ? undefined : state)}
            className={classNames(`c-${stateTemper(state) ?? 'none'}`, 'group relative pb-1.5 text-left whitespace-nowrap focus-visible:-outline-offset-2')}
          >
            <i aria-hidden className={classNames('mb-2 block h-2 border-y border-(--ce) group-first:border-l group-last:border-r', bar(state))} />
            <b className="mr-2 text-20 font-medium">{formatNumber(count, 0)}</b>
            <span className={classNames('transition-colors duration-quick group-hover:text-ink', pressed ? 'font-medium text-ink' : 'text-quiet')}>{stateLabel(state)}</span>
            {pressed && <i aria-hidden className="absolute right-3 bottom-0 left-0 h-0.5 bg-ink" />}
          </button>
        )
      })}
    </div>
  )
}

function bar(state: JobState): string {
  if (state === 'draft') return 'border-dashed'
  if (state === 'cancelled') return '[background:var(--hatch)]'
  return 'bg-(--c)'
}
