import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import { SampleState } from '../../../shared/api/words.ts'
import { samplesQuery } from '../../api/samples.ts'
import { useMe } from '../../api/session.ts'
import { sampleColumns } from '../../components/samples/sample-columns.tsx'
import { Live } from '../../components/ui/live.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { CsvButton } from '../../components/ui/table/csv-button.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'
import { useLiveState } from '../../lib/live.ts'

/** The samples that I may see, found by number, heat, lot or the code of a label. */
export function SamplesPage() {
  const me = useMe()
  const live = useLiveState()
  const [params] = useSearchParams()
  const state = SampleState.safeParse(params.get('state')).data
  const search = params.get('search')?.slice(0, 100) || undefined
  const samples = useInfiniteQuery(samplesQuery({ state, search }))
  const rows = useMemo(() => samples.data?.pages.flatMap(({ items }) => items) ?? [], [samples.data])
  const columns = useMemo(() => sampleColumns({ zone: me.timeZone, manyCustomers: me.customerId === null }), [me.customerId, me.timeZone])
  const title = me.customerName ? `Samples of ${me.customerName}` : 'Samples'
  return (
    <>
      <PageTitle title={title} actions={<><Live at={live.lastAt ?? samples.dataUpdatedAt} broken={!live.connected && live.lastAt !== null} /><CsvButton name="samples" columns={columns} rows={rows} /></>} />
      <QueryState query={samples} what="the samples" empty={{ when: ({ pages }) => !state && !search && pages[0]?.items.length === 0, title: 'No samples yet', text: 'Samples appear here when a job is placed.' }}>
        {() => (
          <DataTable
            caption={title} server columns={columns} rows={rows} rowId={({ id }) => id} isVoid={(row) => row.state === 'void'}
            more={{ noun: rows.length === 1 ? 'sample' : 'samples', busy: samples.isFetchingNextPage, ...(samples.hasNextPage && { onMore: () => void samples.fetchNextPage() }) }}
          />
        )}
      </QueryState>
    </>
  )
}
