import { useQuery, useSuspenseQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { invoiceQuery } from '../../api/reports.ts'
import { sessionQuery } from '../../api/session.ts'
import { InvoiceSheet } from '../../components/billing/invoice-sheet.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'

/** One invoice, to read and to print. */
export function InvoicePage() {
  const { invoiceId = '' } = useParams()
  const invoice = useQuery(invoiceQuery(invoiceId))
  const { data: { company } } = useSuspenseQuery(sessionQuery)
  return (
    <QueryState query={invoice} what="the invoice">
      {(found) => (
        <>
          <div className="not-printed">
            <PageTitle
              crumb={{ to: '/invoices', label: 'Invoices' }} title={<>Invoice <span className="mono">{found.number}</span></>}
              actions={<><ButtonLink kind="soft" to={`/jobs/${found.jobId}`}>Job {found.jobNumber}</ButtonLink><Button kind="main" icon="print" onClick={() => window.print()}>Print</Button></>}
            />
          </div>
          <InvoiceSheet invoice={found} company={company} />
        </>
      )}
    </QueryState>
  )
}
