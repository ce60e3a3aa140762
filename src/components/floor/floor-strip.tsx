import type { CSSProperties } from 'react'
import type { FloorStrip as Strip } from '../../../shared/api/benches.ts'
import { classNames } from '../ui/class-names.ts'
import { Popover } from '../ui/feedback/popover.tsx'
import { temperOf } from '../ui/traveller/temper.ts'
import type { Stretch } from './day-scale.ts'
import { sampleList, shortNumber, stripStates, stripTime } from './strip-words.ts'
import { StripWhy } from './strip-why.tsx'

export const laneHeight = 28

/** One planned, running or done stretch of work: filled when done or running, only its spine coloured while it is planned. */
export function FloorStrip({ strip, at, lane, zone, bench, first }: { strip: Strip; at: Stretch; lane: number; zone: string; bench: string; first: boolean }) {
  const count = new Set(strip.sampleNumbers).size
  const filled = strip.state !== 'planned'
  const place: CSSProperties = { left: `${at.left}%`, width: `${at.width}%`, top: 4 + lane * laneHeight, height: laneHeight - 2 }
  const button = (
    <button
      type="button" data-strip="" tabIndex={first ? 0 : -1} style={place}
      aria-label={`${sampleList(strip.jobNumber, strip.sampleNumbers)}, ${strip.label}, ${stripTime(strip, zone)}, ${stripStates[strip.state]}`}
      className={classNames(
        `c-${temperOf(strip.stage)}`, '@container absolute ml-px min-w-6 overflow-hidden border border-l-4 border-l-(--c) pl-1 text-left text-[0.78125rem]/5.5 whitespace-nowrap shadow-[-1px_0_0_var(--ce)] hover:border-ink hover:border-l-(--c) focus-visible:z-2',
        filled ? 'border-(--ce) bg-(--c) text-(--on)' : 'border-edge bg-sheet', strip.state === 'started' && 'z-1 outline-[1.5px] outline-offset-[1.5px] outline-ink',
      )}
    >
      <span className="@max-[27px]:hidden">{shortNumber(strip.jobNumber)}{count > 1 && <span className={classNames('text-12 @max-[50px]:hidden', !filled && 'text-quiet')}> × {count}</span>}</span>
    </button>
  )
  return <Popover label="Why here and then" trigger={button}><StripWhy strip={strip} zone={zone} bench={bench} /></Popover>
}
