import { useQuery } from '@tanstack/react-query'
import { Link, useParams } from 'react-router-dom'
import type { Sample } from '../../../shared/api/samples.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { sampleQuery } from '../../api/samples.ts'
import { useMay } from '../../api/session.ts'
import { HoldQuestion } from '../../components/jobs/job/hold-question.tsx'
import { SampleTests } from '../../components/jobs/job/sample-tests.tsx'
import { Photos } from '../../components/samples/photos.tsx'
import { SampleSteps } from '../../components/samples/sample-steps.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { Pairs } from '../../components/ui/pairs.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { SideSection } from '../../components/ui/side-section.tsx'
import { Flag } from '../../components/ui/traveller/flag.tsx'
import { State } from '../../components/ui/traveller/state.tsx'
import { TravellerLine } from '../../components/ui/traveller/traveller-line.tsx'
import { When } from '../../components/ui/when.tsx'

/** One sample: its traveller, what each step is and why, its tests and results, photos and holds. */
export function SamplePage() {
  const { sampleId = '' } = useParams()
  const sample = useQuery(sampleQuery(sampleId))
  return <QueryState query={sample} what="the sample">{(found) => <Content sample={found} />}</QueryState>
}

function Content({ sample }: { sample: Sample }) {
  const may = useMay()
  const { number, jobId, jobNumber, timeZone: zone, next } = sample
  const open = sample.holds.filter(({ releasedAt }) => releasedAt === null)
  const past = sample.holds.filter(({ releasedAt }) => releasedAt !== null)
  const mayWork = may('prepare', 'Step')
  return (
    <>
      <PageTitle
        crumb={{ to: `/jobs/${jobId}`, label: jobNumber }} title={<>Sample <span className="mono">{number}</span></>}
        under={
          <>
            <State state={sample.state} className="text-ink" />
            {sample.onHold && <Flag>on hold</Flag>}
            {!sample.onHold && <span>{sample.now}</span>}
          </>
        }
        actions={
          <>
            {may('receive', 'Sample') && sample.state === 'expected' && <ButtonLink kind={mayWork && next ? 'soft' : 'main'} to={`/receive?sample=${sample.id}`}>Receive</ButtonLink>}
            {mayWork && next?.benchId && <ButtonLink kind="main" to={`/bench/${next.benchId}?step=${next.stepId}`}>{next.label.charAt(0).toUpperCase() + next.label.slice(1)} at the bench</ButtonLink>}
          </>
        }
      />
      {open.length > 0 && <div className="mb-8">{open.map((hold) => <HoldQuestion key={hold.id} hold={hold} zone={zone} />)}</div>}
      <SideSection title="Traveller">
        <TravellerLine size="l" nodes={sample.traveller} zone={zone} onPhone="upright" />
      </SideSection>
      <div className="grid grid-cols-[minmax(0,1fr)_312px] items-start gap-12 max-wide:grid-cols-1">
        <div className="min-w-0">
          <SideSection title={`Tests, ${sample.tests.length}`}>
            <SampleTests
              tests={sample.tests}
              links={({ runId, state }) => runId && (
                <>
                  {may('review', 'TestRun') && state === 'recorded' && <Link to={`/review?run=${runId}`}>Review</Link>}
                </>
              )}
            />
          </SideSection>
          {may('read', 'Step') && <SideSection title="Steps"><SampleSteps steps={sample.steps} zone={zone} mayOpenBench={may('record', 'TestRun')} /></SideSection>}
        </div>
        <aside>
          <SideSection title="As ordered">
            <Pairs
              items={[
                ['Customer', sample.customerName], ['Order', sample.purchaseOrder || 'none given'], ['Heat', <span key="heat" className="mono">{sample.heat || '–'}</span>], ['Lot', <span key="lot" className="mono">{sample.lot || '–'}</span>],
                ['Material', sample.material], ['Form', `${sample.piece.form} ${sizeText(sample.piece)}`.trim()], ['Site', sample.siteName],
              ]}
            />
          </SideSection>
          <SideSection title="As received">
            {sample.receivedAt ? <Pairs items={[['Received', <When key="at" at={sample.receivedAt} show="both" zone={zone} />], ['Condition', sample.condition || 'not noted']]} /> : <p className="text-quiet">Not received yet.</p>}
            <div className="mt-4"><Photos photos={sample.photos} zone={zone} /></div>
          </SideSection>
          {past.length > 0 && (
            <SideSection title="Earlier holds">
              <ol className="grid gap-3 text-13">
                {past.map((hold) => (
                  <li key={hold.id}>
                    {hold.reason} {hold.question}
                    {hold.answer && <span className="block"><b>Answer:</b> {hold.answer}</span>}
                    {hold.releasedAt && <span className="block text-quiet">released <When at={hold.releasedAt} show="both" zone={zone} /></span>}
                  </li>
                ))}
              </ol>
            </SideSection>
          )}
        </aside>
      </div>
    </>
  )
}
