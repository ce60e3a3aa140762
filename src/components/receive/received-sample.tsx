import type { Sample } from '../../../shared/api/samples.ts'
import { Button } from '../ui/buttons/button.tsx'
import { ButtonLink } from '../ui/buttons/button-link.tsx'
import { Note } from '../ui/feedback/note.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { State } from '../ui/traveller/state.tsx'
import { When } from '../ui/when.tsx'
import { SamplePhotos } from './sample-photos.tsx'

/** A sample that is here already: when and how it came, what is open about it, and where it goes next. */
export function ReceivedSample({ sample, onNext }: { sample: Sample; onNext: (() => void) | undefined }) {
  const hold = sample.holds.find(({ releasedAt }) => releasedAt === null)
  return (
    <section aria-label={sample.number} className="on-sheet grid gap-4 border border-line bg-sheet p-5 max-tablet:-mx-gutter max-tablet:border-x-0 max-tablet:px-gutter">
      <h2 className="mono text-26! font-medium tracking-tight">{sample.number}</h2>
      <State state={sample.state} />
      <Pairs items={[
        ...(sample.receivedAt ? [['Received', <When key="at" at={sample.receivedAt} show="both" zone={sample.timeZone} />] as const] : []), ['How it came', sample.condition || 'not said'], ['Next', sample.next?.label ?? 'nothing'],
      ]} />
      {hold && <Note kind="warn" title={`On hold: ${hold.reason}`}>{hold.answer ? `Answered: ${hold.answer}` : `Asked: ${hold.question}`}</Note>}
      <SamplePhotos sample={sample} />
      <div className="flex flex-wrap gap-3">
        {onNext && <Button kind="main" onClick={onNext}>Next of this job</Button>}
        <ButtonLink to={`/samples/${sample.id}`}>Open the sample</ButtonLink>
      </div>
    </section>
  )
}
