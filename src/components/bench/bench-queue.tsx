import { Link } from 'react-router-dom'
import type { Queue, QueueItem } from '../../../shared/api/benches.ts'
import { Kbd } from '../ui/kbd.tsx'
import { TravellerLine } from '../ui/traveller/traveller-line.tsx'
import { formatDay, formatTime, isSameDay } from '../../lib/format.ts'

/** What is to do at a bench, in the order of the plan; below 1100 px it lies above the sheet. */
export function BenchQueue({ queue: { bench, items, doneToday, lastDoneAt, timeZone }, chosen, to }: { queue: Queue; chosen: string | undefined; to: (stepId: string) => string }) {
  const today = new Date()
  return (
    <nav aria-label="Queue" className="flex flex-col border-r border-line py-5 max-desk:flex-row max-desk:items-stretch max-desk:border-r-0 max-desk:border-b max-desk:py-0">
      <div className="flex items-baseline justify-between gap-2 pr-5 pb-3 pl-gutter text-13 text-quiet max-desk:w-34 max-desk:flex-none max-desk:flex-col max-desk:justify-center max-desk:pr-3 max-desk:pb-0">
        <h2 className="text-15/5 font-bold text-ink">{bench.name}, {new Intl.DateTimeFormat(undefined, { weekday: 'long', timeZone }).format(today)}</h2>
        <span className="whitespace-nowrap">{items.length} to do</span>
      </div>
      <ol className="max-desk:flex max-desk:flex-1 max-desk:overflow-x-auto">
        {items.map((item) => (
          <li key={item.stepId} aria-current={item.stepId === chosen ? 'true' : undefined} className="group border-t border-line last:border-b max-desk:flex-[0_0_268px] max-desk:border-0 max-desk:border-l max-desk:last:border-b-0">
            <Link to={to(item.stepId)} className="grid min-h-touch grid-cols-[52px_minmax(0,1fr)] gap-1 py-3 pr-5 pl-gutter no-underline hover:bg-wash group-aria-[current]:bg-sheet group-aria-[current]:shadow-[inset_4px_0_var(--ink)] max-desk:h-full max-desk:grid-cols-[46px_minmax(0,1fr)] max-desk:px-3.5 max-desk:py-2.5 max-desk:group-aria-[current]:shadow-[inset_0_4px_var(--ink)] focus-visible:-outline-offset-2">
              <span className="text-15 text-quiet">{timeOf(item, timeZone, today)}</span>
              <span className="block min-w-0 group-aria-[current]:[--ground:var(--sheet)]">
                <b className="mono block text-[0.96875rem]! font-medium whitespace-nowrap">{item.sampleNumber}</b>
                <span className="mb-0.75 block truncate text-[0.875rem]/5 text-quiet">{item.label}, {item.material}</span>
                <TravellerLine nodes={item.traveller} size="xs" />
                <Remarks item={item} />
              </span>
            </Link>
          </li>
        ))}
      </ol>
      {items.length === 0 && <p className="px-gutter py-3.5 text-15 text-quiet">Nothing is planned here. Scan a sample, or look at another bench.</p>}
      <p className="px-gutter py-3.5 text-13 text-quiet max-desk:hidden">{doneToday === 0 ? 'Nothing done yet today' : `${doneToday} done today${lastDoneAt ? `, last at ${formatTime(lastDoneAt, { zone: timeZone })}` : ''}`}</p>
      <p className="mt-auto px-gutter pt-3 text-13 text-quiet max-desk:hidden"><Kbd>N</Kbd> next <Kbd className="ml-3">/</Kbd> scan <Kbd className="ml-3">?</Kbd> all keys</p>
    </nav>
  )
}

function Remarks({ item: { state, lateDays, note } }: { item: QueueItem }) {
  return (
    <>
      {state === 'started' && <span className="mt-0.5 block text-13 font-medium">begun</span>}
      {note && <span className={`mt-0.5 block text-13 font-medium ${note === 'on hold' ? 'text-amber' : ''}`}>{note}</span>}
      {lateDays > 0 && <span className="mt-0.5 block text-13 font-medium text-red">job {lateDays} {lateDays === 1 ? 'day' : 'days'} late</span>}
    </>
  )
}

function timeOf({ plannedStart }: QueueItem, zone: string, today: Date): string {
  if (!plannedStart) return '–'
  return isSameDay(plannedStart, today, zone) ? formatTime(plannedStart, { zone }) : formatDay(plannedStart, 'short', { zone })
}
