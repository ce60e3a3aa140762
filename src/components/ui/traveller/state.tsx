import type { JobState, RunState, ReportState, SampleState, StepState, TestState } from '../../../../shared/api/words.ts'
import { classNames } from '../class-names.ts'
import { temperRow, type Temper } from './temper.ts'

export type StateName = JobState | TestState | SampleState | StepState | RunState | ReportState

/** How far each state is along the row; `draft` is dashed, `off` struck, `none` empty. */
const looks: Record<StateName, Temper | 'draft' | 'off' | 'none'> = {
  draft: 'draft',
  placed: 'straw',
  'awaiting samples': 'gold',
  'in work': 'bronze',
  'in review': 'purple',
  reported: 'blue',
  closed: 'slate',
  cancelled: 'off',
  waiting: 'straw',
  ready: 'gold',
  'in run': 'bronze',
  recorded: 'purple',
  accepted: 'purple',
  void: 'off',
  expected: 'straw',
  received: 'gold',
  done: 'purple',
  missing: 'none',
  'to come': 'none',
  planned: 'none',
  started: 'bronze',
  open: 'bronze',
  'sent back': 'none',
  stopped: 'off',
  'being made': 'purple',
  current: 'blue',
  superseded: 'off',
  withdrawn: 'off',
}

/** The temper of a state, or undefined for those outside the row (draft, cancelled, void…). */
export function stateTemper(state: StateName): Temper | undefined {
  return temperRow.find((temper) => temper === looks[state])
}

/** "Awaiting samples" */
export function stateLabel(state: StateName): string {
  return state.charAt(0).toUpperCase() + state.slice(1)
}

const struck = 'bg-[linear-gradient(to_top_right,transparent_calc(50%-1px),var(--edge)_0_calc(50%+1px),transparent_0)]'

/** Swatch and name of a state of a job, test, sample, step, run or report. `chip` fills it; use that inside pictures only. */
export function State({ state, label = stateLabel(state), chip = false, className }: { state: StateName; label?: string; chip?: boolean; className?: string }) {
  const look = looks[state]
  const temper = stateTemper(state)
  if (chip && temper) {
    return <span className={classNames(`c-${temper}`, 'inline-flex h-6 items-center rounded border border-(--ce) bg-(--c) px-2 text-13 font-medium whitespace-nowrap text-(--on)', className)}>{label}</span>
  }
  return (
    <span className={classNames(`c-${temper ?? 'none'}`, 'inline-flex items-center gap-2 whitespace-nowrap', className)}>
      <i aria-hidden className={classNames('size-3 flex-none border-[1.5px] border-(--ce)', look === 'draft' ? 'border-dashed' : look === 'off' ? struck : 'bg-(--c)')} />
      {label}
    </span>
  )
}
