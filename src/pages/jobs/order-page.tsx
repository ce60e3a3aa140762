import { useQuery } from '@tanstack/react-query'
import { useDeferredValue, useMemo, useState } from 'react'
import { Navigate, useNavigate, useParams, useSearchParams } from 'react-router-dom'
import type { Job } from '../../../shared/api/jobs.ts'
import { orderFaults } from '../../../shared/orders/order-faults.ts'
import { priceOf } from '../../../shared/orders/price-of.ts'
import { catalogueQuery } from '../../api/catalogue.ts'
import { jobQuery, quoteQuery, useDiscardDraft } from '../../api/jobs.ts'
import { useMe } from '../../api/session.ts'
import { SampleGrid } from '../../components/jobs/grid/sample-grid.tsx'
import { LockedOrder } from '../../components/jobs/order/locked-order.tsx'
import { ConflictNote, SavingWords, WaitsNote } from '../../components/jobs/order/draft-notes.tsx'
import { orderOf } from '../../components/jobs/draft/draft-state.ts'
import { OrderHead } from '../../components/jobs/order/order-head.tsx'
import { BottomBar, PlaceJob, usePlaceJob } from '../../components/jobs/order/place-job.tsx'
import { PromisePanel } from '../../components/jobs/order/promise-panel.tsx'
import { SampleCards } from '../../components/jobs/order/sample-cards.tsx'
import { stopperOf } from '../../components/jobs/draft/stopper.ts'
import { useOrderDraft } from '../../components/jobs/draft/use-order-draft.ts'
import { usePhone } from '../../components/jobs/draft/use-phone.ts'
import { useRested } from '../../components/jobs/draft/use-rested.ts'
import { Button } from '../../components/ui/buttons/button.tsx'
import { Dialog } from '../../components/ui/feedback/dialog.tsx'
import { Kbd } from '../../components/ui/kbd.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { SectionHead } from '../../components/ui/section-head.tsx'
import { after } from '../../lib/after.ts'
import { formatDay, formatMoney } from '../../lib/format.ts'

const quoteRestMs = 400

/** A new job: its samples and tests, with price and promise while they are typed. */
export function OrderPage() {
  const { jobId = '' } = useParams()
  const job = useQuery(jobQuery(jobId))
  return (
    <QueryState query={job} what="the draft">
      {(found) => (found.state === 'draft' ? <Order key={found.id} job={found} /> : <Navigate to={`/jobs/${found.id}`} replace />)}
    </QueryState>
  )
}

function Order({ job }: { job: Job }) {
  const me = useMe()
  const zone = me.timeZone
  const isPhone = usePhone()
  const [params] = useSearchParams()
  const locked = job.waitsForPayment
  const draft = useOrderDraft(job, locked)
  const place = usePlaceJob(job, draft.save)
  const order = useMemo(() => (locked ? job.order : orderOf(draft.state)), [draft.state, job.order, locked])
  const checked = useDeferredValue(order)
  const offers = useQuery(catalogueQuery).data?.offers
  const faults = useMemo(() => orderFaults(checked, offers), [checked, offers])
  const price = useMemo(() => priceOf(checked, offers ?? [], 0), [checked, offers])
  const quote = useQuery({ ...quoteQuery(useRested(checked, quoteRestMs)), gcTime: 60_000 })
  const currency = quote.data?.currency ?? job.currency
  const stopper = locked ? null : stopperOf(draft, order, faults)
  return (
    <>
      <PageTitle
        crumb={{ to: '/jobs', label: 'Jobs' }} title={<>New job <span className="mono text-quiet">{job.number}</span></>}
        actions={!locked && <><SavingWords saving={draft.saving} zone={zone} /><Discard job={job} samples={order.samples.length} /></>}
      />
      {locked && <WaitsNote job={job} place={place} left={params.get('payment') === 'left'} />}
      <ConflictNote draft={draft} job={job} />
      <div className="grid grid-cols-[minmax(0,1fr)_328px] items-start gap-10 max-wide:grid-cols-1 max-tablet:pb-20">
        <div className="min-w-0">
          {locked ? <LockedOrder order={job.order} /> : (
            <>
              <OrderHead job={job} head={draft.state.head} onHead={(change, mark) => draft.change((now) => ({ ...now, head: { ...now.head, ...change } }), `head.${mark}`)} />
              <SectionHead title="Samples" aside={!isPhone && <span className="max-desk:hidden">paste rows with <Kbd>Ctrl V</Kbd>, go on typing below, <Kbd>Ctrl D</Kbd> fills down, <Kbd>Space</Kbd> ticks</span>} />
              {isPhone ? <SampleCards draft={draft} faults={faults} rowMinor={price.rowMinor} currency={currency} />
                : <SampleGrid draft={draft} faults={faults} rowMinor={price.rowMinor} netMinor={price.netMinor} currency={currency} />}
            </>
          )}
        </div>
        <aside aria-label="Price and promise" className="wide:sticky wide:top-6">
          <PromisePanel
            order={order} quote={quote.data} at={quote.dataUpdatedAt} working={quote.isFetching} zone={zone}
            onSite={(siteId) => !locked && draft.change((now) => ({ ...now, head: { ...now.head, siteId } }))}
          >
            {quote.error && <p role="alert" className="text-13 text-red">Price and promise did not come: {quote.error.message}</p>}
            <PlaceJob place={place} stopper={stopper} label={locked ? 'Go on paying' : 'Place job'} />
          </PromisePanel>
        </aside>
      </div>
      <BottomBar
        place={place} stopper={stopper} total={quote.data ? formatMoney(quote.data.totalMinor, currency) : ''}
        under={quote.data?.promise ? `${formatDay(quote.data.promise.finish, 'week', { zone })}, ${quote.data.promise.siteName}` : 'no day promised yet'}
      />
    </>
  )
}

function Discard({ job, samples }: { job: Job; samples: number }) {
  const [open, setOpen] = useState(false)
  const discard = useDiscardDraft(job.id)
  const navigate = useNavigate()
  return (
    <>
      <Button kind="soft" onClick={() => setOpen(true)}>Discard</Button>
      <Dialog
        open={open} onOpenChange={setOpen} title={`Discard draft ${job.number}?`} confirm="Discard" danger busy={discard.isPending} error={discard.error?.message}
        onConfirm={() => after(discard.mutateAsync({ version: job.version }), () => void navigate('/jobs'))}
      >
        {samples === 0 ? 'It has no samples yet.' : `Its ${samples === 1 ? 'sample goes' : `${samples} samples go`} with it. This cannot be undone.`}
      </Dialog>
    </>
  )
}
