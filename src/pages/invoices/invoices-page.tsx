import { useInfiniteQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { invoicesQuery } from '../../api/reports.ts'
import { useMe } from '../../api/session.ts'
import { invoiceColumns } from '../../components/billing/invoice-columns.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { CsvButton } from '../../components/ui/table/csv-button.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'

/** The invoices that I may see, newest first. */
export function InvoicesPage() {
  const me = useMe()
  const invoices = useInfiniteQuery(invoicesQuery)
  const rows = useMemo(() => invoices.data?.pages.flatMap(({ items }) => items) ?? [], [invoices.data])
  const currency = rows[0]?.currency ?? 'GBP'
  const columns = useMemo(() => invoiceColumns({ currency, manyCustomers: me.customerId === null }), [currency, me.customerId])
  return (
    <>
      <PageTitle title={me.customerName ? `Invoices to ${me.customerName}` : 'Invoices'} actions={<CsvButton name="invoices" columns={columns} rows={rows} />} />
      <QueryState query={invoices} what="the invoices" empty={{ when: ({ pages }) => pages[0]?.items.length === 0, title: 'No invoices yet', text: 'An invoice is written when a job is paid.' }}>
        {() => (
          <DataTable
            caption="Invoices" columns={columns} rows={rows} rowId={({ id }) => id}
            more={{ noun: rows.length === 1 ? 'invoice' : 'invoices', busy: invoices.isFetchingNextPage, ...(invoices.hasNextPage && { onMore: () => void invoices.fetchNextPage() }) }}
          />
        )}
      </QueryState>
    </>
  )
}
