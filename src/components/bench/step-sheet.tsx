import { useState } from 'react'
import type { Bench, QueueItem } from '../../../shared/api/benches.ts'
import type { Sample, StepInSample } from '../../../shared/api/samples.ts'
import { methodOf } from '../../../shared/methods.ts'
import { useFinishStep, useStartStep } from '../../api/samples.ts'
import { after } from '../../lib/after.ts'
import { formatTime } from '../../lib/format.ts'
import { useTyped } from '../../lib/kept-readings/use-typed.ts'
import { Button } from '../ui/buttons/button.tsx'
import { useKeys } from '../ui/buttons/use-keys.ts'
import { Note } from '../ui/feedback/note.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { TextField } from '../ui/fields/text-field.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { SheetFoot } from './sheet-foot.tsx'
import { SheetHead } from './sheet-head.tsx'
import { stepCautions, stepWords } from './step-words.ts'

/** A step of preparation: what to do, started and done with one key each. */
export function StepSheet({ item, step, sample, bench, onDone }: { item: QueueItem; step: StepInSample; sample: Sample; bench: Bench; onDone: () => void }) {
  const start = useStartStep()
  const finish = useFinishStep()
  const say = useToast()
  const [typed, type, clear] = useTyped(`step.${step.id}`)
  const [pressed, setPressed] = useState(false)
  const isStarted = step.state === 'started'
  const refusal = item.onHold ? 'The sample is on hold.' : !item.isHere ? 'The sample has not been received yet.' : bench.out ? `${bench.name} is out of use.` : !isStarted && item.note.endsWith(' first') ? `${item.note}.` : ''
  const begin = () => !refusal && !isStarted && !start.isPending && start.mutate({ stepId: step.id, benchId: bench.id })
  const done = () => {
    if (!isStarted || finish.isPending || pressed) return
    setPressed(true)
    after(finish.mutateAsync({ stepId: step.id, remark: (typed['remark'] ?? '').trim() }), () => { clear(); say({ text: `${item.sampleNumber}: ${step.label} done.` }); onDone() }, () => setPressed(false))
  }
  useKeys({ b: begin, d: done })
  const test = sample.tests.find(({ id }) => id === step.testId)
  const error = start.error ?? finish.error
  return (
    <div className="flex min-w-0 flex-1 flex-col">
      <SheetHead sample={sample} title={step.label.charAt(0).toUpperCase() + step.label.slice(1)} summary={test ? `for ${test.label}` : undefined} equipment={bench.equipment} zone={sample.timeZone} lines={isStarted && step.startedAt ? <p>begun {formatTime(step.startedAt, { zone: sample.timeZone })}{step.personName && ` by ${step.personName}`}</p> : undefined} />
      <div className="grid flex-1 content-start gap-6 px-10 py-8 max-desk:px-gutter">
        {error && <Note kind="bad" title="That did not work.">{error.message}</Note>}
        <section className="max-w-180">
          <h2 className="mb-2 border-t border-ink pt-2 text-15 font-bold">What to do</h2>
          <ol className="grid list-decimal gap-2 pl-6">{(stepWords[step.kind] ?? []).map((words) => <li key={words}>{words}</li>)}</ol>
        </section>
        <section className="max-w-180">
          <h2 className="mb-1 border-t border-ink pt-2 text-15 font-bold">What it is for</h2>
          <Pairs items={sample.tests.filter(({ id }) => step.testId === null || id === step.testId).map(({ label, summary }) => [label, summary])} />
        </section>
        {isStarted && <TextField className="max-w-120" label="Remark" aside="if any" value={typed['remark'] ?? ''} onChange={(event) => type({ remark: event.target.value })} maxLength={500} />}
      </div>
      <SheetFoot cautions={[...(stepCautions[step.kind] ?? []), ...(step.kind === 'etch' && test ? (methodOf(test.methodId)?.cautions(test.parameters) ?? []) : [])]} stopperId="cannot-start" stopper={refusal}>
        {isStarted
          ? <Button kind="main" size="big" keys="D" busy={finish.isPending} onClick={done}>Done</Button>
          : <Button kind="main" size="big" keys="B" busy={start.isPending} refusal={refusal} refusalAt="hidden" onClick={begin}>Start</Button>}
      </SheetFoot>
    </div>
  )
}
