import { useQuery } from '@tanstack/react-query'
import { useCallback, useState } from 'react'
import { useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Queue } from '../../../shared/api/benches.ts'
import { queueQuery } from '../../api/benches.ts'
import { BenchQueue } from '../../components/bench/bench-queue.tsx'
import { BenchSheet } from '../../components/bench/bench-sheet.tsx'
import { KeysDialog } from '../../components/bench/dialogs/keys-dialog.tsx'
import { rememberBench } from '../../components/bench/my-bench.ts'
import { useHereDetail, useTakeCode, type TakeCode } from '../../components/frame/frame-context.ts'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { useKeys } from '../../components/ui/buttons/use-keys.ts'
import { MessageCard } from '../../components/ui/feedback/message-card.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'

/** One bench: what is planned here at the left, the sheet of what is done now at the right, nothing else. */
export function BenchPage() {
  const { benchId = '' } = useParams()
  const queue = useQuery(queueQuery(benchId))
  useHereDetail(queue.data?.bench.name)
  return (
    <div className="at-bench min-h-[calc(100dvh-56px)] text-17">
      <QueryState query={queue} what="the queue">{(found) => <Bench key={benchId} queue={found} />}</QueryState>
    </div>
  )
}

function Bench({ queue }: { queue: Queue }) {
  const { bench, items } = queue
  const [search, setSearch] = useSearchParams()
  const navigate = useNavigate()
  const [keysOpen, setKeysOpen] = useState(false)
  rememberBench(bench.id)
  const asked = search.get('step')
  const item = items.find(({ stepId }) => stepId === asked) ?? (asked === null ? items[0] : undefined)
  const open = (stepId: string | undefined) => setSearch(stepId ? { step: stepId } : {})
  const next = () => {
    const at = items.findIndex(({ stepId }) => stepId === item?.stepId)
    const after = items.slice(at + 1).find(({ isHere, onHold }) => isHere && !onHold) ?? items.find(({ isHere, onHold, stepId }) => isHere && !onHold && stepId !== item?.stepId) ?? items[at + 1]
    open(after?.stepId)
  }
  useTakeCode(useCallback<TakeCode>(({ id }) => {
    const scanned = items.find(({ sampleId, isHere, onHold }) => sampleId === id && isHere && !onHold) ?? items.find(({ sampleId }) => sampleId === id)
    if (scanned) setSearch({ step: scanned.stepId })
    return scanned !== undefined
  }, [items, setSearch]))
  useKeys({ n: next, '?': () => setKeysOpen(true) })
  return (
    <div className="grid min-h-[calc(100dvh-56px)] grid-cols-[304px_minmax(0,1fr)] max-desk:grid-cols-[minmax(0,1fr)] max-desk:grid-rows-[auto_1fr]">
      <BenchQueue queue={queue} chosen={item?.stepId} to={(stepId) => `/bench/${bench.id}?step=${stepId}`} />
      <section aria-label="Sheet" className="on-sheet flex min-w-0 flex-col bg-sheet">
        {item ? <BenchSheet key={item.stepId} item={item} bench={bench} onNext={next} /> : (
          <MessageCard className="m-10" title={asked ? 'This step is no longer in the queue' : `Nothing to do at ${bench.name}`} action={<ButtonLink to={asked ? `/bench/${bench.id}` : '/bench'} onClick={() => asked && void navigate(`/bench/${bench.id}`)}>{asked ? 'Show what is next' : 'Choose another bench'}</ButtonLink>}>
            {asked ? 'It was recorded, finished, or planned elsewhere.' : 'New work appears here by itself as it is planned.'}
          </MessageCard>
        )}
      </section>
      {keysOpen && <KeysDialog onClose={() => setKeysOpen(false)} />}
    </div>
  )
}
