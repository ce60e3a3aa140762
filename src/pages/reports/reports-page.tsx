import { useInfiniteQuery, useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { useSearchParams } from 'react-router-dom'
import type { ReportRow } from '../../../shared/api/reports.ts'
import { reportQuery, reportsQuery } from '../../api/reports.ts'
import { useMe } from '../../api/session.ts'
import { OpenReport } from '../../components/reports/open-report.tsx'
import { reportColumns } from '../../components/reports/report-columns.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { CsvButton } from '../../components/ui/table/csv-button.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'

/** The reports that I may read, newest first; `?open=` shows one of them in full. */
export function ReportsPage() {
  const me = useMe()
  const [params] = useSearchParams()
  const search = params.get('search')?.slice(0, 100) || undefined
  const open = params.get('open') ?? undefined
  const reports = useInfiniteQuery(reportsQuery(search ? { search } : {}))
  const rows = useMemo((): ReportRow[] => reports.data?.pages.flatMap(({ items }) => items) ?? [], [reports.data])
  const columns = useMemo(() => reportColumns({ zone: me.timeZone, manyCustomers: me.customerId === null }), [me.customerId, me.timeZone])
  return (
    <>
      <PageTitle title={me.customerName ? `Reports for ${me.customerName}` : 'Reports'} actions={<CsvButton name="reports" columns={columns} rows={rows} />} />
      {open && <Opened key={open} id={open} zone={me.timeZone} />}
      <QueryState query={reports} what="the reports" empty={{ when: ({ pages }) => !search && pages[0]?.items.length === 0, title: 'No reports yet', text: 'A report appears here when it is issued, and is mailed too.' }}>
        {() => (
          <DataTable
            caption="Reports" server columns={columns} rows={rows} rowId={({ id }) => id} current={open}
            more={{ noun: rows.length === 1 ? 'report' : 'reports', busy: reports.isFetchingNextPage, ...(reports.hasNextPage && { onMore: () => void reports.fetchNextPage() }) }}
          />
        )}
      </QueryState>
    </>
  )
}

function Opened({ id, zone }: { id: string; zone: string }) {
  const report = useQuery(reportQuery(id))
  return <QueryState query={report} what="the report">{(found) => <OpenReport report={found} zone={zone} />}</QueryState>
}
