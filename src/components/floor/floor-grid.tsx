import { useMemo, type KeyboardEvent } from 'react'
import type { Floor } from '../../../shared/api/benches.ts'
import { calendarDay, formatDay, formatTime } from '../../lib/format.ts'
import { ScrollSideways } from '../ui/table/scroll-sideways.tsx'
import { clockMinutes, dayScale, hourTicks, stretchOn, type DayScale } from './day-scale.ts'
import { FloorRow, type FloorSite } from './floor-row.tsx'

/** Sites as bands, benches as rows, days as columns; a row is planned work against the hours there are. Arrow keys go from strip to strip. */
export function FloorGrid({ floor, now }: { floor: Floor; now: Date }) {
  const scale = useMemo(() => dayScale(floor), [floor])
  const stripsAt = (id: string) => floor.strips.filter(({ benchId }) => benchId === id)
  return (
    <ScrollSideways label="Floor">
      <div
        role="table" aria-label="Floor" onKeyDown={moveFocus}
        className="grid [--day:168px] [--name:208px] max-tablet:[--day:220px] max-tablet:[--name:112px]"
        style={{ gridTemplateColumns: `var(--name) repeat(${floor.days.length}, minmax(var(--day), 1fr))` }}
      >
        <FloorHead floor={floor} scale={scale} now={now} />
        {floor.sites.map((site) => (
          <div key={site.id} role="rowgroup" aria-label={site.name} className="col-span-full grid [grid-template-columns:subgrid] pb-2.5">
            <BandHead site={site} floor={floor} scale={scale} />
            {site.benches.map((bench) => <FloorRow key={bench.id} bench={bench} site={site} strips={stripsAt(bench.id)} days={floor.days} scale={scale} now={now} />)}
          </div>
        ))}
      </div>
    </ScrollSideways>
  )
}

function FloorHead({ floor, scale, now }: { floor: Floor; scale: DayScale; now: Date }) {
  const zone = floor.sites[0]?.timeZone ?? 'UTC'
  const today = calendarDay(now, zone)
  const at = (100 * (clockMinutes(now, zone) - scale.from)) / (scale.to - scale.from)
  return (
    <div role="row" className="col-span-full grid [grid-template-columns:subgrid]">
      <span role="columnheader" className="sticky left-0 z-4 bg-paper"><span className="sr-only">Bench</span></span>
      {floor.days.map(({ day }, place) => (
        <span key={day} role="columnheader" className="border-l border-line pb-1 font-bold">
          <span className="pl-2">{formatDay(day, 'week')} <small className="text-13 font-normal text-quiet">{day === today ? 'today' : isAfterGap(floor.days[place - 1]?.day, day) ? 'after the weekend' : ''}</small></span>
          <span aria-hidden className="relative block h-3.5 text-12/3.5 font-normal text-quiet">
            {hourTicks(scale).map(({ hour, left }) => <span key={hour} className={`absolute pl-0.75 ${left > 0 ? 'border-l border-line' : 'pl-2!'} ${day === today && Math.abs(left - at) < 12 ? 'invisible' : ''}`} style={{ left: `${left}%` }}>{hour}</span>)}
            {day === today && at >= 0 && at <= 100 && <span className="absolute z-3 -translate-x-1/2 rounded bg-ink px-1 font-medium text-paper" style={{ left: `${at}%` }}>{formatTime(now, { zone })}</span>}
          </span>
        </span>
      ))}
    </div>
  )
}

/** Site, its load, and how many steps begin on each day. */
function BandHead({ site, floor, scale }: { site: FloorSite; floor: Floor; scale: DayScale }) {
  const open = site.benches.reduce((sum, { openMinutes }) => sum + openMinutes, 0)
  const held = site.benches.reduce((sum, { heldMinutes }) => sum + heldMinutes, 0)
  const ids = new Set(site.benches.map(({ id }) => id))
  const strips = floor.strips.filter(({ benchId }) => ids.has(benchId))
  return (
    <div role="row" className="col-span-full grid h-8.5 [grid-template-columns:subgrid] text-13 text-quiet">
      <h2 role="rowheader" className="sticky left-0 z-4 flex items-center justify-between gap-2 border-t border-ink bg-paper pr-3 text-15 font-bold text-ink">
        <span className="truncate">{site.name}</span>{open > 0 && <span className="text-13 font-normal text-quiet max-tablet:hidden">{Math.round((100 * held) / open)} %</span>}
      </h2>
      {floor.days.map(({ day }) => {
        const steps = strips.filter((strip) => calendarDay(strip.start, site.timeZone) === day && stretchOn(day, strip, site.timeZone, scale)).reduce((sum, { stepIds }) => sum + stepIds.length, 0)
        return <span key={day} role="cell" className="flex items-center border-t border-l border-ink border-l-line pl-2">{steps === 0 ? 'nothing' : steps === 1 ? '1 step' : `${steps} steps`}</span>
      })}
    </div>
  )
}

function isAfterGap(before: string | undefined, day: string): boolean {
  return before !== undefined && Date.parse(day) - Date.parse(before) > 86_400_000
}

/** Left and right along the bench, up and down to the nearest strip of the next bench that has one. */
function moveFocus(event: KeyboardEvent<HTMLElement>): void {
  const from = event.target instanceof HTMLElement && event.target.closest<HTMLElement>('[data-strip]')
  if (!from || !['ArrowLeft', 'ArrowRight', 'ArrowUp', 'ArrowDown'].includes(event.key)) return
  event.preventDefault()
  const strips = (row: Element) => [...row.querySelectorAll<HTMLElement>('[data-strip]')]
  const row = from.closest('[data-row]')
  if (!row) return
  const forth = event.key === 'ArrowRight' || event.key === 'ArrowDown' ? 1 : -1
  if (event.key === 'ArrowLeft' || event.key === 'ArrowRight') {
    const own = strips(row)
    own[own.indexOf(from) + forth]?.focus()
    return
  }
  const rows = [...event.currentTarget.querySelectorAll('[data-row]')].filter((one) => one === row || strips(one).length > 0)
  const next = rows[rows.indexOf(row) + forth]
  if (!next) return
  const left = (element: HTMLElement) => element.getBoundingClientRect().left
  strips(next).sort((a, b) => Math.abs(left(a) - left(from)) - Math.abs(left(b) - left(from)))[0]?.focus()
}
