import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { JobState, jobStates } from '../../../shared/api/words.ts'
import { jobCountsQuery, jobsQuery, useDraftJob } from '../../api/jobs.ts'
import { useMay, useMe } from '../../api/session.ts'
import { jobColumns } from '../../components/jobs/list/job-columns.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { useToast } from '../../components/ui/feedback/toast-region.tsx'
import { Live } from '../../components/ui/live.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { CsvButton } from '../../components/ui/table/csv-button.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'
import { TemperScale } from '../../components/ui/traveller/temper-scale.tsx'
import { useLiveState } from '../../lib/live.ts'

/** The jobs that I may see: how far each is, when it is due, what it costs, its report. */
export function JobsPage() {
  const me = useMe()
  const may = useMay()
  const live = useLiveState()
  const [params, setParams] = useSearchParams()
  const state = JobState.safeParse(params.get('state')).data
  const search = params.get('search')?.slice(0, 100) || undefined
  const sort = params.get('sort') === 'due' ? 'due' : 'newest'
  const jobs = useInfiniteQuery(jobsQuery({ state, search, sort }))
  const counts = useQuery(jobCountsQuery).data?.counts
  const rows = useMemo(() => jobs.data?.pages.flatMap(({ items }) => items) ?? [], [jobs.data])
  const currency = rows[0]?.currency ?? 'GBP'
  const mayAnswer = may('answer', 'Hold')
  const mayPay = may('pay', 'Job')
  const columns = useMemo(
    () => jobColumns({ zone: me.timeZone, currency, mayAnswer, mayPay, manyCustomers: me.customerId === null }),
    [currency, mayAnswer, mayPay, me.customerId, me.timeZone],
  )
  const all = jobStates.map((one) => ({ state: one, count: counts?.[one] ?? 0 }))
  const total = search ? undefined : state ? counts?.[state] : all.reduce((sum, { count }) => sum + count, 0)
  const choose = (chosen: JobState | undefined) => setParams((now) => {
    const next = new URLSearchParams(now)
    if (chosen) next.set('state', chosen)
    else next.delete('state')
    return next
  }, { replace: true })
  const newJob = may('create', 'Job') && <NewJob />
  return (
    <>
      <PageTitle
        title={me.customerName ? `Jobs of ${me.customerName}` : 'Jobs'}
        actions={
          <>
            <Live at={live.lastAt ?? jobs.dataUpdatedAt} broken={!live.connected && live.lastAt !== null} />
            <CsvButton name="jobs" columns={columns} rows={rows} />
            {newJob}
          </>
        }
      />
      <TemperScale counts={all} chosen={state} onChoose={choose} />
      <QueryState
        query={jobs} what="the jobs"
        empty={{
          when: ({ pages }) => !state && !search && pages[0]?.items.length === 0, title: 'No jobs yet',
          text: newJob ? 'Start with the samples: paste them from a spreadsheet or type them, then tick the tests.' : 'Jobs appear here when a customer places one.', action: newJob,
        }}
      >
        {() => (
          <DataTable
            caption={me.customerName ? `Jobs of ${me.customerName}` : 'Jobs'} server columns={columns} rows={rows} rowId={({ id }) => id}
            more={{ noun: rows.length === 1 ? 'job' : 'jobs', total, busy: jobs.isFetchingNextPage, ...(jobs.hasNextPage && { onMore: () => void jobs.fetchNextPage() }) }}
          />
        )}
      </QueryState>
    </>
  )
}

function NewJob() {
  const draft = useDraftJob()
  const navigate = useNavigate()
  const say = useToast()
  const start = () => draft.mutate({}, {
    onSuccess: ({ id }) => void navigate(`/jobs/${id}/order`),
    onError: ({ message }) => say({ kind: 'bad', text: message }),
  })
  return <Button kind="main" busy={draft.isPending} onClick={start}>New job</Button>
}
