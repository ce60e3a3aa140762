import { useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { methodOf } from '../../../shared/methods.ts'
import { useReviewRun } from '../../api/test-runs.ts'
import { after } from '../../lib/after.ts'
import { formatDay, formatTime } from '../../lib/format.ts'
import { refusalWords } from '../../lib/refused-field.ts'
import { useKeys } from '../ui/buttons/use-keys.ts'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { ExplainPanel } from './explain-panel.tsx'
import { HeldAgainst } from './held-against.tsx'
import { keepRemark } from './kept-remark.ts'
import { lookOver } from './look-over.ts'
import { ReadingsSection } from './readings-section.tsx'
import { ResultsTable } from './results-table.tsx'
import { ReviewFooter, reviewRefusal } from './review-footer.tsx'
import { RunFacts } from './run-facts.tsx'
import { RunPictures } from './run-pictures.tsx'
import { SendBackDialog } from './send-back-dialog.tsx'
import { UnusualList } from './unusual-list.tsx'

const closed = 'none'

/** One run under review: what is unusual, results with their origin, readings, and the decision. */
export function ReviewRun({ run, onDone }: { run: TestRun; onDone: () => void }) {
  const [address, setAddress] = useSearchParams()
  const [sendingBack, setSendingBack] = useState(false)
  const review = useReviewRun(run.id)
  const say = useToast()
  const method = methodOf(run.methodId)
  const results = run.evaluation?.results ?? []
  const asked = address.get('explain')
  const explained = asked === closed ? undefined : (results.find(({ key }) => key === (asked ?? method?.mainResult)) ?? results[0])
  const explain = (key: string) => setAddress((now) => {
    const next = new URLSearchParams(now)
    next.set('explain', key)
    return next
  }, { replace: true, preventScrollReset: true })
  const explainNext = () => {
    const next = results[(results.findIndex(({ key }) => key === explained?.key) + 1) % results.length]
    if (next) explain(next.key)
  }
  const decide = (outcome: 'accepted' | 'sent back', said: { remark: string; readings: string[] }) => after(review.mutateAsync({ version: run.version, outcome, ...said }), () => {
    keepRemark(run.id, '')
    setSendingBack(false)
    say({ text: <><span className="mono">{run.sampleNumber}</span> {method?.label(run.parameters)}: run {outcome}.</> })
    onDone()
  })
  const accept = () => decide('accepted', { remark: '', readings: [] })
  const may = reviewRefusal(run) === ''
  useKeys({ e: explainNext, escape: () => explain(closed), ...(may && { b: () => setSendingBack(true), 'ctrl enter': () => !review.isPending && accept() }) })
  return (
    <section aria-label="Run" className={`grid min-w-0 content-start desk:border-l desk:border-line wide:min-h-full wide:grid-rows-[auto_auto_1fr_auto] ${explained ? 'wide:grid-cols-[minmax(0,1fr)_408px]' : 'grid-cols-[minmax(0,1fr)]'} max-wide:grid-cols-[minmax(0,1fr)]`}>
      <header className="px-8 pt-5 pb-3.5 max-tablet:px-gutter">
        <h1 className="text-26 font-medium tracking-[-.014em]"><span className="mono">{run.sampleNumber}</span> {method?.label(run.parameters) ?? run.methodId}, run {run.number}</h1>
        <p className="mt-0.5 flex flex-wrap gap-x-4 text-[0.875rem]/5.5 text-quiet">
          <span>{[run.material, `${run.piece.form} ${sizeText(run.piece)}`.trim()].filter(Boolean).join(', ')}</span>
          <span>run by {run.performedBy} on {run.equipment?.code ?? run.benchName}</span>
          <span>{formatDay(run.startedAt, 'week', { zone: run.timeZone })}, {formatTime(run.startedAt, { zone: run.timeZone })}{run.recordedAt && ` to ${formatTime(run.recordedAt, { zone: run.timeZone })}`}</span>
          <span>{method?.summary(run.parameters)}</span>
        </p>
      </header>
      <div className="px-8 max-tablet:px-gutter">
        <UnusualList {...lookOver(run)} />
        <ResultsTable run={run} explained={explained?.key} onExplain={explain} />
      </div>
      {explained && <ExplainPanel run={run} result={explained} asked={asked !== null} onClose={() => explain(closed)} />}
      <div className="px-8 pb-6 max-tablet:px-gutter">
        <RunPictures run={run} />
        <ReadingsSection run={run} />
        <div className="grid grid-cols-[1fr_1.1fr] gap-8 max-list:grid-cols-1 max-list:gap-0">
          <HeldAgainst run={run} />
          <RunFacts run={run} />
        </div>
      </div>
      <ReviewFooter run={run} busy={review.isPending && !sendingBack} error={sendingBack ? undefined : refusalWords(review.error)} onSendBack={() => { review.reset(); setSendingBack(true) }} onAccept={accept} />
      <SendBackDialog run={run} open={sendingBack} onOpenChange={setSendingBack} busy={review.isPending} error={review.error} onSend={(said) => decide('sent back', said)} />
    </section>
  )
}
