import { Link } from 'react-router-dom'
import type { ReportRow } from '../../../shared/api/reports.ts'
import { reportFile } from '../../api/reports.ts'
import type { Column } from '../ui/table/column.ts'
import { Icon } from '../ui/icon.tsx'
import { Two } from '../ui/table/two.tsx'
import { State } from '../ui/traveller/state.tsx'
import { When } from '../ui/when.tsx'

/** The columns of the list of reports; `manyCustomers`: the row says whose it is. */
export function reportColumns({ zone, manyCustomers }: { zone: string; manyCustomers: boolean }): Column<ReportRow>[] {
  return [
    {
      id: 'search', head: 'Report', name: 'Report', sort: false, card: 'start', nowrap: true, value: ({ number, revision }) => fullNumber({ number, revision }), filter: { kind: 'text', words: 'report, job or order' },
      cell: (row) => <><Link to={`/reports?open=${row.id}`} className="mono inline-block font-medium leading-6">{fullNumber(row)}</Link><Two>of <Link to={`/jobs/${row.jobId}`} className="mono">{row.jobNumber}</Link></Two></>,
    },
    ...(manyCustomers ? [{ id: 'customer', head: 'Customer', sort: false, value: ({ customerName }: ReportRow) => customerName, cell: ({ customerName }: ReportRow) => customerName }] : []),
    { id: 'order', head: 'Order', sort: false, value: ({ purchaseOrder }) => purchaseOrder, cell: ({ purchaseOrder }) => purchaseOrder || <span className="text-quiet">none</span> },
    { id: 'what', head: 'Samples and tests', sort: false, value: ({ samples, tests }) => `${samples} samples; ${tests}`, cell: ({ samples, tests }) => <>{samples === 1 ? '1 sample' : `${samples} samples`}<Two>{tests}</Two></> },
    { id: 'state', head: 'State', sort: false, card: 'end', value: ({ state }) => state, cell: ({ state }) => <State state={state} /> },
    { id: 'issued', head: 'Issued', sort: false, nowrap: true, card: 'foot-start', value: ({ issuedAt }) => issuedAt, cell: ({ issuedAt, signedBy }) => <>{issuedAt && <When at={issuedAt} zone={zone} />}<Two>signed by {signedBy}</Two></> },
    { id: 'file', head: 'PDF', sort: false, card: 'foot-end', nowrap: true, cell: ({ id, state }) => (state === 'being made' ? <span className="text-quiet">being made</span> : <a href={reportFile(id)} className="inline-flex items-center gap-1.5"><Icon name="download" />Download</a>) },
  ]
}

/** "R-26-00417/1", whether the number comes with its revision or without. */
export function fullNumber({ number, revision }: Pick<ReportRow, 'number' | 'revision'>): string {
  return number.includes('/') ? number : `${number}/${revision}`
}
