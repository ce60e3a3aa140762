import type { TestRun } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { formatDay, formatWhen } from '../../lib/format.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Icon } from '../ui/icon.tsx'

/** Why this run cannot be accepted or sent back by me now; empty when it can. */
export function reviewRefusal({ state, notMineToReview }: TestRun): string {
  if (state === 'open') return 'It is still at the bench.'
  if (state !== 'recorded') return `It is ${state} already.`
  return notMineToReview
}

/** What is decided about the run, and by what right. */
export function ReviewFooter({ run, busy, error, onSendBack, onAccept }: { run: TestRun; busy: boolean; error: string | undefined; onSendBack: () => void; onAccept: () => void }) {
  const refusal = reviewRefusal(run)
  const last = run.reviews.at(-1)
  return (
    <footer className="sticky bottom-0 z-5 flex items-center justify-between gap-x-6 max-tablet:flex-wrap gap-y-2.5 border-t border-line bg-paper px-8 py-3 max-tablet:px-gutter">
      <p className="flex min-w-0 items-start gap-2 text-13 text-quiet" role={error ? 'alert' : undefined}>
        <Icon name={error ? 'stop' : refusal ? 'lock' : 'check'} className={error ? 'mt-px text-red' : 'mt-px'} />
        <span className={error ? 'text-red' : undefined}>
          {error ?? (refusal ? <>{refusal}{run.state !== 'recorded' && last && ` ${last.by}, ${formatWhen(last.at, 'week', { zone: run.timeZone })}.`}</> : `you may review ${methodOf(run.methodId)?.title ?? run.methodId} until ${run.mayReviewUntil ? formatDay(run.mayReviewUntil, 'full') : 'further notice'}`)}
        </span>
      </p>
      {(run.state === 'recorded' || run.state === 'open') && (
        <div className="ml-auto flex flex-none gap-3 max-tablet:ml-0 max-tablet:w-full max-tablet:[&>*]:flex-1">
          <Button size="big" refusal={refusal} refusalAt="hidden" onClick={onSendBack}>Send back…</Button>
          <Button kind="main" size="big" keys="Ctrl Enter" busy={busy} refusal={refusal} refusalAt="hidden" onClick={onAccept} className="[&>kbd]:max-tablet:hidden">Accept run</Button>
        </div>
      )}
    </footer>
  )
}
