import { useQuery } from '@tanstack/react-query'
import { Navigate, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Job } from '../../../shared/api/jobs.ts'
import { jobQuery, useDraftJob } from '../../api/jobs.ts'
import { useMay } from '../../api/session.ts'
import { CancelJob } from '../../components/jobs/job/cancel-job.tsx'
import { HoldQuestion } from '../../components/jobs/job/hold-question.tsx'
import { IssueReport } from '../../components/jobs/job/issue-report.tsx'
import { JobHistory } from '../../components/jobs/job/job-history.tsx'
import { JobSamples } from '../../components/jobs/job/job-samples.tsx'
import { DueSection, FilesSection, MoneySection, ReportsSection } from '../../components/jobs/job/job-side.tsx'
import { Messages } from '../../components/jobs/job/messages.tsx'
import { PaymentReturn } from '../../components/jobs/job/payment-return.tsx'
import { LockedOrder } from '../../components/jobs/order/locked-order.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { useToast } from '../../components/ui/feedback/toast-region.tsx'
import { Live } from '../../components/ui/live.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { SectionHead } from '../../components/ui/section-head.tsx'
import { Flag } from '../../components/ui/traveller/flag.tsx'
import { Heat } from '../../components/ui/traveller/heat.tsx'
import { State } from '../../components/ui/traveller/state.tsx'
import { When } from '../../components/ui/when.tsx'
import { useLiveState } from '../../lib/live.ts'

/** One job: where each sample is, what is asked, when it is due, what it costs, what was reported. */
export function JobPage() {
  const { jobId = '' } = useParams()
  const [params] = useSearchParams()
  const may = useMay()
  const job = useQuery(jobQuery(jobId))
  const isBack = params.get('payment') === 'back'
  return (
    <QueryState query={job} what="the job">
      {(found) => (found.state === 'draft' && !isBack && may('change', 'Job') ? <Navigate to={{ pathname: `/jobs/${found.id}/order`, search: params.toString() }} replace /> : <Content job={found} isBack={isBack && may('pay', 'Job')} />)}
    </QueryState>
  )
}

function Content({ job, isBack }: { job: Job; isBack: boolean }) {
  const may = useMay()
  const live = useLiveState()
  const isDraft = job.state === 'draft'
  const open = job.holds.filter(({ releasedAt }) => releasedAt === null)
  const mayPrint = !isDraft && job.state !== 'cancelled'
  return (
    <>
      <PageTitle
        crumb={{ to: '/jobs', label: 'Jobs' }} title={<>Job <span className="mono">{job.number}</span> for {job.customerName}</>}
        under={
          <>
            <State state={job.state} className="text-ink" />
            <Heat state={job.state} />
            {open.length > 0 && <Flag>{open.length === 1 ? 'one sample on hold' : `${open.length} samples on hold`}</Flag>}
            {job.lateDays > 0 && <Flag kind="late">{job.lateDays === 1 ? '1 day late' : `${job.lateDays} days late`}</Flag>}
            {job.order.purchaseOrder && <span>purchase order {job.order.purchaseOrder}</span>}
            {job.placedAt && <span>placed <When at={job.placedAt} zone={job.timeZone} /></span>}
            <span>{job.siteName}</span>
          </>
        }
        actions={
          <>
            {may('cancel', 'Job') && <CancelJob job={job} />}
            {mayPrint && <ButtonLink kind="soft" icon="print" to={`/jobs/${job.id}/labels`}>Labels</ButtonLink>}
            {mayPrint && <ButtonLink kind="soft" icon="print" to={`/jobs/${job.id}/packing-slip`}>Packing slip</ButtonLink>}
            {may('create', 'Job') && !isDraft && <OrderAgain job={job} />}
            {may('issue', 'Report') && !isDraft && job.state !== 'cancelled' && <IssueReport job={job} />}
          </>
        }
      />
      {isBack && <PaymentReturn job={job} />}
      <div className="grid grid-cols-[minmax(0,1fr)_312px] items-start gap-12 max-wide:grid-cols-1">
        <div className="min-w-0">
          {open.map((hold) => <HoldQuestion key={hold.id} hold={hold} zone={job.timeZone} />)}
          {isDraft ? <LockedOrder order={job.order} /> : (
            <section aria-label="Samples" className={open.length > 0 ? 'mt-8' : undefined}>
              <SectionHead title={`Samples, ${job.samples.length}`} aside={<Live broken={!live.connected && live.lastAt !== null} at={live.connected ? undefined : live.lastAt ?? undefined} />} />
              <JobSamples job={job} mayAnswer={may('answer', 'Hold')} />
            </section>
          )}
        </div>
        <aside>
          {!isDraft && job.state !== 'cancelled' && <DueSection job={job} />}
          <Messages job={job} />
          <MoneySection job={job} />
          <ReportsSection job={job} />
          <FilesSection job={job} mayAdd={may('create', 'File') && job.state !== 'closed' && job.state !== 'cancelled'} />
          {may('read', 'Event') && <JobHistory jobId={job.id} zone={job.timeZone} />}
        </aside>
      </div>
    </>
  )
}

function OrderAgain({ job }: { job: Job }) {
  const draft = useDraftJob()
  const navigate = useNavigate()
  const say = useToast()
  const start = () => draft.mutate({ from: job.id }, {
    onSuccess: ({ id, number }) => {
      void navigate(`/jobs/${id}/order`)
      say({ text: `${number} begins with the samples and tests of ${job.number}.` })
    },
    onError: ({ message }) => say({ kind: 'bad', text: message }),
  })
  return <Button kind="soft" busy={draft.isPending} onClick={start}>Order again</Button>
}
