import type { Bench, QueueItem } from '../../../shared/api/benches.ts'
import type { Sample } from '../../../shared/api/samples.ts'
import type { Method } from '../../../shared/method/method.ts'
import { useStartRun } from '../../api/test-runs.ts'
import { nameOf } from '../../methods/results/result-facts.tsx'
import { Button } from '../ui/buttons/button.tsx'
import { useKeys } from '../ui/buttons/use-keys.ts'
import { Note } from '../ui/feedback/note.tsx'
import { limitText } from '../ui/limits/limit-rule.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { SheetFoot } from './sheet-foot.tsx'
import { SheetHead } from './sheet-head.tsx'

/** A measuring step before its run: what is asked, on which machine, and the one key that begins it. */
export function BeginRun({ item, sample, bench, method }: { item: QueueItem; sample: Sample; bench: Bench; method: Method }) {
  const start = useStartRun()
  const test = sample.tests.find(({ id }) => id === item.testId)
  const parameters = test?.parameters ?? {}
  const refusal = item.onHold ? 'The sample is on hold.' : !item.isHere ? 'The sample has not been received yet.' : bench.out ? `${bench.name} is out of use.` : item.note.endsWith(' first') ? `${item.note}.` : ''
  const begin = () => !refusal && test && !start.isPending && start.mutate({ testId: test.id, benchId: bench.id })
  useKeys({ b: begin })
  return (
    <div className="flex min-w-0 flex-1 flex-col">
      <SheetHead sample={sample} title={item.label} summary={test ? method.summary(parameters) : undefined} equipment={bench.equipment} zone={sample.timeZone} />
      <div className="grid flex-1 content-start gap-5 px-10 py-8 max-desk:px-gutter">
        {item.note === 'sent back by review' && <Note kind="warn" title="Sent back by review.">The earlier run stays on record; measure again.</Note>}
        {start.error && <Note kind="bad" title="The run did not begin.">{start.error.message}</Note>}
        {test?.requirement && test.requirement.limits.length > 0 && (
          <section className="max-w-120">
            <h2 className="mb-1 text-15 font-bold">Asked for</h2>
            <Pairs look="ruled" items={test.requirement.limits.map(({ key, lower, upper }) => {
              const name = method.resultNames.find((one) => one.key === key)
              return [nameOf(method, key), `${limitText(lower, upper, name?.decimals)} ${name?.unit ?? ''}`]
            })} />
          </section>
        )}
        <p className="text-quiet">{refusal || 'The run begins with your name, this machine and the time; every reading is kept as it is typed.'}</p>
      </div>
      <SheetFoot cautions={test ? method.cautions(parameters) : []} stopperId="cannot-begin" stopper={refusal}>
        <Button kind="main" size="big" keys="B" busy={start.isPending} refusal={refusal} refusalAt="hidden" onClick={begin}>Begin run</Button>
      </SheetFoot>
    </div>
  )
}
