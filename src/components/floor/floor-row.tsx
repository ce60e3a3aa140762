import type { Floor, FloorStrip as Strip } from '../../../shared/api/benches.ts'
import { calendarDay } from '../../lib/format.ts'
import { classNames } from '../ui/class-names.ts'
import { Popover } from '../ui/feedback/popover.tsx'
import { clockMinutes, stretchOn, type DayScale } from './day-scale.ts'
import { FloorStrip, laneHeight } from './floor-strip.tsx'
import { lanesOf } from './lanes-of.ts'
import { StripWhy } from './strip-why.tsx'

export type FloorSite = Floor['sites'][number]
type Bench = FloorSite['benches'][number]

/** A bench and its days. Its name opens the list of everything on it, for strips that are too short to read or to press. */
export function FloorRow({ bench, site, strips, days, scale, now }: { bench: Bench; site: FloorSite; strips: readonly Strip[]; days: Floor['days']; scale: DayScale; now: Date }) {
  const { lanes, laneOf } = lanesOf(strips)
  const load = bench.openMinutes > 0 ? Math.round((100 * bench.heldMinutes) / bench.openMinutes) : undefined
  const zone = site.timeZone
  const today = calendarDay(now, zone)
  return (
    <div role="row" data-row="" className="group col-span-full grid [grid-template-columns:subgrid]" style={{ minHeight: 6 + lanes * laneHeight }}>
      <div role="rowheader" className="sticky left-0 z-4 border-t border-line bg-paper group-hover:bg-wash">
        <Popover
          label={`${bench.name}, ${site.name}`}
          trigger={
            <button type="button" className="grid size-full min-h-[33px] grid-cols-[minmax(0,1fr)_auto_44px] items-center gap-2 pr-3 text-left text-13 focus-visible:-outline-offset-2 max-tablet:grid-cols-1 max-tablet:pr-1">
              <b className="truncate text-[0.875rem]">{bench.name}</b>
              <span className="mono text-quiet max-tablet:hidden">{bench.code}</span>
              <span className={classNames('text-right max-tablet:hidden', load !== undefined && load > 100 ? 'font-medium text-red' : 'text-quiet')}>{load === undefined ? 'shut' : `${load} %`}</span>
            </button>
          }
        >
          <BenchList bench={bench} strips={strips} zone={zone} load={load} />
        </Popover>
      </div>
      {days.map(({ day }) => (
        <div key={day} role="cell" className="relative border-t border-l border-line bg-shut">
          {bench.open.map((open) => {
            const at = stretchOn(day, open, zone, scale)
            return at && at.width > 0 && <i key={open.start} aria-hidden className="absolute inset-y-0 bg-sheet" style={{ left: `${at.left}%`, width: `${at.width}%` }} />
          })}
          {bench.out && day >= today && <OutOfUse from={day === today ? clockMinutes(now, zone) : scale.from} scale={scale} says={day === today || (days[0] !== undefined && days[0].day > today && day === days[0].day)} />}
          {strips.map((strip) => {
            const at = stretchOn(day, strip, zone, scale)
            return at && <FloorStrip key={strip.stepIds[0]} strip={strip} at={at} lane={laneOf.get(strip) ?? 0} zone={zone} bench={bench.name} first={strip === strips[0]} />
          })}
          {day === today && <NowLine at={clockMinutes(now, zone)} scale={scale} />}
        </div>
      ))}
    </div>
  )
}

function OutOfUse({ from, scale, says }: { from: number; scale: DayScale; says: boolean }) {
  const left = Math.min(100, Math.max(0, (100 * (from - scale.from)) / (scale.to - scale.from)))
  return (
    <>
      <i aria-hidden className="absolute inset-y-0 right-0 [background:var(--hatch)]" style={{ left: `${left}%` }} />
      {says && <span className="absolute top-2 z-1 ml-1.5 bg-paper px-1 text-12 whitespace-nowrap" style={left > 60 ? { right: 4 } : { left: `${left}%` }}>out of use</span>}
    </>
  )
}

function NowLine({ at, scale }: { at: number; scale: DayScale }) {
  if (at < scale.from || at > scale.to) return null
  return <i aria-hidden className="pointer-events-none absolute inset-y-0 z-2 border-l-[1.5px] border-ink" style={{ left: `${(100 * (at - scale.from)) / (scale.to - scale.from)}%` }} />
}

function BenchList({ bench, strips, zone, load }: { bench: Bench; strips: readonly Strip[]; zone: string; load: number | undefined }) {
  return (
    <>
      <p className="mb-2 font-medium">{bench.name} <span className="mono text-quiet">{bench.code}</span></p>
      <p className="mb-3 text-13 text-quiet">{load === undefined ? 'Not open on these days.' : `${load} % of its ${Math.round(bench.openMinutes / 60)} open hours taken.`}{bench.out && ' Out of use now.'}</p>
      {strips.length === 0 && <p>Nothing on these days.</p>}
      <ul className="grid gap-3">{strips.map((strip) => <li key={strip.stepIds[0]} className="border-t border-line pt-2.5"><StripWhy strip={strip} zone={zone} bench={bench.name} /></li>)}</ul>
    </>
  )
}
