import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { useCallback } from 'react'
import { useSearchParams } from 'react-router-dom'
import { sampleQuery, samplesQuery } from '../../api/samples.ts'
import { useTakeCode, type TakeCode } from '../../components/frame/frame-context.ts'
import { ExpectedJobs } from '../../components/receive/expected-jobs.tsx'
import { ParcelList } from '../../components/receive/parcel-list.tsx'
import { ReceiveSample } from '../../components/receive/receive-sample.tsx'
import { ReceivedSample } from '../../components/receive/received-sample.tsx'
import { RecentlyReceived } from '../../components/receive/recently-received.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { MessageCard } from '../../components/ui/feedback/message-card.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'

/** Takes samples in: scan a label or open an expected job, look, say how it came, go on to the next. */
export function ReceivePage() {
  const [search, setSearch] = useSearchParams()
  const jobId = search.get('job') ?? undefined
  const sampleId = search.get('sample') ?? undefined
  const expected = useInfiniteQuery(samplesQuery({ state: 'expected' }))
  const coming = expected.data?.pages.flatMap(({ items }) => items) ?? []
  useTakeCode(useCallback<TakeCode>(({ subject, id }) => {
    if (subject === 'Report') return false
    setSearch(subject === 'Job' ? { job: id } : { sample: id })
    return true
  }, [setSearch]))
  return (
    <>
      <PageTitle title="Receive samples" under={<span>Scan a label anywhere on this page, or open an expected job.</span>} actions={jobId && <ButtonLink to={`/jobs/${jobId}/labels`} icon="print">Labels</ButtonLink>} />
      <div className="grid grid-cols-[minmax(0,1fr)_328px] items-start gap-12 max-wide:grid-cols-1 max-wide:gap-8">
        {jobId || sampleId ? <Parcel key={jobId ?? sampleId} jobId={jobId} sampleId={sampleId} /> : (
          <MessageCard icon="scan" title="Scan the first label of the parcel">Each sample has a label with a code. Without a scanner, type its number into the field at the top, or choose the job from the list.</MessageCard>
        )}
        <aside aria-label="Parcels">
          <QueryState query={expected} what="what is expected">{() => <ExpectedJobs samples={coming} chosen={jobId} />}</QueryState>
          {expected.hasNextPage && <Button kind="soft" className="mb-6" busy={expected.isFetchingNextPage} onClick={() => void expected.fetchNextPage()}>Show more that is expected</Button>}
          <RecentlyReceived />
        </aside>
      </div>
    </>
  )
}

/** A job's samples and the one that is in hand. A scanned sample brings its job along. */
function Parcel({ jobId: given, sampleId }: { jobId: string | undefined; sampleId: string | undefined }) {
  const [, setSearch] = useSearchParams()
  const scanned = useQuery({ ...sampleQuery(sampleId ?? ''), enabled: sampleId !== undefined })
  const jobId = given ?? scanned.data?.jobId
  const list = useInfiniteQuery({ ...samplesQuery({ jobId }), enabled: jobId !== undefined })
  const samples = [...(list.data?.pages.flatMap(({ items }) => items) ?? [])].sort((a, b) => a.number.localeCompare(b.number))
  const next = samples.find(({ id, state }) => state === 'expected' && id !== sampleId)
  const chosen = sampleId ?? next?.id
  const inHand = useQuery({ ...sampleQuery(chosen ?? ''), enabled: chosen !== undefined })
  const goOn = () => jobId && setSearch(next ? { job: jobId, sample: next.id } : { job: jobId })
  const [first] = samples
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_minmax(0,440px)] items-start gap-8 max-list:grid-cols-1">
      <div className="max-list:order-2">
        <QueryState query={list} what="the samples of the job">
          {() => (
            <>
              <p className="mb-2">{first && <><b className="mono">{first.jobNumber}</b> for {first.customerName}, <span className="text-quiet">{samples.filter(({ state }) => state !== 'expected' && state !== 'missing').length} of {samples.length} received</span></>}</p>
              <ParcelList samples={samples} chosen={chosen} />
              {list.hasNextPage && <Button kind="soft" className="mt-3" busy={list.isFetchingNextPage} onClick={() => void list.fetchNextPage()}>Show more samples</Button>}
            </>
          )}
        </QueryState>
      </div>
      {chosen ? (
        <QueryState query={inHand} what="the sample">
          {(sample) => (sample.state === 'expected' || sample.state === 'missing' ? <ReceiveSample key={sample.id} sample={sample} onDone={goOn} /> : <ReceivedSample sample={sample} onNext={next ? goOn : undefined} />)}
        </QueryState>
      ) : list.data && <MessageCard icon="check" title="Everything of this job is received">Its samples are planned onto the benches now.</MessageCard>}
    </div>
  )
}
