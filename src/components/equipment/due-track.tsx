import { formatDay } from '../../lib/format.ts'
import { daysBetween } from './equipment-standing.ts'

/** The stretch of time that all tracks of a list share, in calendar days. */
export type Span = { from: string; to: string; today: string }

const place = (day: string, { from, to }: Span) => Math.min(100, Math.max(0, (100 * daysBetween(from, day)) / daysBetween(from, to)))

/** When something falls due, on a line of days: grey is what is left, hatched red what it is over. */
export function DueTrack({ due, span }: { due: string; span: Span }) {
  const left = daysBetween(span.today, due)
  const at = place(due, span)
  const now = place(span.today, span)
  return (
    <span role="img" aria-label={left < 0 ? `${-left} days over` : `${left} days left`} className="relative block h-5.5 bg-[linear-gradient(var(--line),var(--line))_0_50%/100%_1px_no-repeat]">
      <i className="absolute -inset-y-2.5 w-px bg-edge" style={{ left: `${now}%` }} />
      <i className={left < 0 ? 'absolute top-1.75 h-2 border border-red bg-[repeating-linear-gradient(135deg,var(--red)_0_1.5px,transparent_1.5px_5px)]' : 'absolute top-2.25 h-1 bg-edge'} style={{ left: `${Math.min(at, now)}%`, width: `${Math.abs(at - now)}%` }} />
      <i className={`absolute top-0.75 h-4 w-0.75 -translate-x-px ${left < 0 ? 'bg-red' : 'bg-ink'}`} style={{ left: `${at}%` }} />
    </span>
  )
}

/** The days along the top: today and the first of every third month that is not too near to it or to the end. Stands in the cell of a head, whose right padding is the table's. */
export function DueTicks({ span }: { span: Span }) {
  const ticks = quarterStarts(span).filter((day) => Math.abs(place(day, span) - place(span.today, span)) > 14 && place(day, span) < 96)
  const at = (day: string) => ({ left: `calc((100% - 28px) * ${place(day, span) / 100})` })
  return (
    <>
      <span className="absolute top-0.5 -translate-x-1/2 font-medium whitespace-nowrap" style={at(span.today)}>today</span>
      {ticks.map((day) => <span key={day} className="absolute top-0.5 -translate-x-1/2 font-normal whitespace-nowrap text-quiet" style={at(day)}>{formatDay(day, 'short')}</span>)}
    </>
  )
}

function quarterStarts({ from, to }: Span): string[] {
  const starts: string[] = []
  for (let year = Number(from.slice(0, 4)); year <= Number(to.slice(0, 4)); year++) {
    for (const month of ['01', '04', '07', '10']) starts.push(`${year}-${month}-01`)
  }
  return starts.filter((day) => day > from && day < to)
}
