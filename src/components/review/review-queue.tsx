import { Link } from 'react-router-dom'
import type { ReviewItem } from '../../../shared/api/test-runs.ts'
import { formatDay } from '../../lib/format.ts'
import { Kbd } from '../ui/kbd.tsx'
import { TravellerLine } from '../ui/traveller/traveller-line.tsx'

/** Runs that wait for a review, by the day they are needed; below 1100 px it lies above the run. An own run waits for someone else. */
export function ReviewQueue({ items, chosen, to }: { items: readonly ReviewItem[]; chosen: string | undefined; to: (testRunId: string) => string }) {
  return (
    <nav aria-label="Queue" className="flex py-5 max-desk:items-stretch max-desk:border-b max-desk:border-line max-desk:py-0 desk:sticky desk:top-0 desk:h-[calc(100dvh-56px)] desk:flex-col">
      <div className="flex items-baseline justify-between gap-2 pr-5 pb-3 pl-6 text-13 text-quiet max-desk:w-30 max-desk:flex-none max-desk:flex-col max-desk:justify-center max-desk:pr-3 max-desk:pb-0 max-tablet:hidden">
        <h2 className="text-15/5 font-bold text-ink">To review</h2>
        <span className="whitespace-nowrap">{items.length === 1 ? '1 run' : `${items.length} runs`}</span>
      </div>
      <ol className="max-desk:flex max-desk:min-w-0 max-desk:flex-1 max-desk:overflow-x-auto desk:min-h-0 desk:overflow-y-auto">
        {items.map((item) => (
          <li key={item.testRunId} aria-current={item.testRunId === chosen ? 'true' : undefined} className="group border-t border-line last:border-b max-desk:flex-[0_0_248px] max-desk:border-0 max-desk:border-l max-desk:last:border-b-0">
            <Link to={to(item.testRunId)} className="grid min-h-touch grid-cols-[48px_minmax(0,1fr)] gap-1 py-3 pr-5 pl-6 no-underline hover:bg-wash focus-visible:-outline-offset-2 group-aria-[current]:bg-sheet group-aria-[current]:shadow-[inset_4px_0_var(--ink)] max-desk:h-full max-desk:px-3.5 max-desk:py-2.5 max-desk:group-aria-[current]:shadow-[inset_0_4px_var(--ink)]">
              <span className="text-13/5.5 text-quiet">{item.neededBy ? formatDay(item.neededBy, 'short') : 'no day'}</span>
              <span className="block min-w-0 group-aria-[current]:[--ground:var(--sheet)]">
                <b className="mono block text-[0.96875rem]! font-medium whitespace-nowrap">{item.sampleNumber}</b>
                <span className="mb-0.75 block text-[0.875rem]/5 text-quiet">{item.label}, run by {item.isOwn ? 'you' : item.performedBy}</span>
                <TravellerLine nodes={item.traveller} size="xs" />
                {item.isOwn && <span className="mt-0.5 block text-13 text-quiet">waits for someone else</span>}
                {item.unusual > 0 && <span className="mt-0.5 block text-13 font-medium">{item.unusual} unusual</span>}
              </span>
            </Link>
          </li>
        ))}
      </ol>
      <p className="px-6 py-3.5 text-13 text-quiet max-desk:hidden">by the day they are needed</p>
      <p className="mt-auto px-6 pt-3 text-13 text-quiet max-desk:hidden"><Kbd>N</Kbd> next <Kbd className="ml-3">E</Kbd> explain <Kbd className="ml-3">B</Kbd> send back</p>
    </nav>
  )
}
