import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import type { Bench, QueueItem } from '../../../shared/api/benches.ts'
import { methodOf } from '../../../shared/methods.ts'
import { sampleQuery } from '../../api/samples.ts'
import { runQuery } from '../../api/test-runs.ts'
import { MessageCard } from '../ui/feedback/message-card.tsx'
import { QueryState } from '../ui/query-state.tsx'
import { BeginRun } from './begin-run.tsx'
import { RunSheet } from './run-sheet.tsx'
import { StepSheet } from './step-sheet.tsx'

/** The sheet that goes with a line of the queue: a run that is open, one to begin, or a step of preparation. */
export function BenchSheet({ item, bench, onNext }: { item: QueueItem; bench: Bench; onNext: () => void }) {
  const sample = useQuery(sampleQuery(item.sampleId))
  const runId = item.runId
  const method = item.methodId === null ? undefined : methodOf(item.methodId)
  if (runId && method) return <OpenRun key={runId} runId={runId} onNext={onNext} />
  return (
    <Padded>
      <QueryState query={sample} what="the sample">
        {(found) => {
          const step = found.steps.find(({ id }) => id === item.stepId)
          if (!step) return <MessageCard title="This step is no longer there">The plan has changed. Take the next in the queue.</MessageCard>
          if (method) return <BeginRun key={item.stepId} item={item} sample={found} bench={bench} method={method} />
          return <StepSheet key={item.stepId} item={item} step={step} sample={found} bench={bench} onDone={onNext} />
        }}
      </QueryState>
    </Padded>
  )
}

/** A run by its id, open or recorded. */
export function OpenRun({ runId, onNext }: { runId: string; onNext: () => void }) {
  const run = useQuery(runQuery(runId))
  return (
    <Padded>
      <QueryState query={run} what="the run">
        {(found) => {
          const method = methodOf(found.methodId)
          return method ? <RunSheet key={found.id} run={found} method={method} onRecorded={onNext} onStopped={() => undefined} /> : <MessageCard icon="stop" title="This program does not know the method">It was run by another version. Ask for an update.</MessageCard>
        }}
      </QueryState>
    </Padded>
  )
}

function Padded({ children }: { children: ReactNode }) {
  return <div className="flex min-w-0 flex-1 flex-col [&>[role=status]]:m-10 [&>[role=alert]]:m-10">{children}</div>
}
