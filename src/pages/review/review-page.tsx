import { useQuery } from '@tanstack/react-query'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { reviewsQuery, runQuery } from '../../api/test-runs.ts'
import { ReviewQueue } from '../../components/review/review-queue.tsx'
import { ReviewRun } from '../../components/review/review-run.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { useKeys } from '../../components/ui/buttons/use-keys.ts'
import { MessageCard } from '../../components/ui/feedback/message-card.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import type { ReviewItem } from '../../../shared/api/test-runs.ts'

const to = (testRunId: string) => `/review?run=${testRunId}`

/** What has been recorded and waits for a second pair of eyes. */
export function ReviewPage() {
  const reviews = useQuery(reviewsQuery)
  return (
    <>
      <title>Review · Crosshead</title>
      {reviews.data ? <Reviews items={reviews.data.items} /> : <div className="px-gutter pt-7"><QueryState query={reviews} what="the runs to review">{() => null}</QueryState></div>}
    </>
  )
}

function Reviews({ items }: { items: readonly ReviewItem[] }) {
  const [address] = useSearchParams()
  const navigate = useNavigate()
  const chosen = address.get('run') ?? firstOf(items)?.testRunId
  const run = useQuery({ ...runQuery(chosen ?? ''), enabled: chosen !== undefined })
  const next = () => {
    const at = items.findIndex(({ testRunId }) => testRunId === chosen)
    const others = [...items.slice(at + 1), ...items.slice(0, Math.max(at, 0))]
    const following = firstOf(others)
    void navigate(following ? to(following.testRunId) : '/review')
  }
  useKeys({ n: next }, items.length > 0)
  if (chosen === undefined) {
    return (
      <div className="px-gutter pt-7">
        <h1 className="mb-5 text-26 font-medium tracking-[-.014em]">Review</h1>
        <MessageCard icon="check" title="Nothing waits for a review" action={<ButtonLink to="/jobs" size="tiny">See the jobs</ButtonLink>}>Runs appear here by themselves when they are recorded at a bench.</MessageCard>
      </div>
    )
  }
  return (
    <div className="grid min-h-[calc(100dvh-56px)] grid-cols-[minmax(0,1fr)] desk:grid-cols-[264px_minmax(0,1fr)] wide:grid-cols-[288px_minmax(0,1fr)] max-desk:content-start">
      <ReviewQueue items={items} chosen={chosen} to={to} />
      {run.data ? <ReviewRun key={run.data.id} run={run.data} onDone={next} /> : <div className="px-8 pt-6"><QueryState query={run} what="the run">{() => null}</QueryState></div>}
    </div>
  )
}

/** An own run waits for someone else, so it is not what one comes for. */
function firstOf(items: readonly ReviewItem[]): ReviewItem | undefined {
  return items.find(({ isOwn }) => !isOwn) ?? items[0]
}
