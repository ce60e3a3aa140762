import { Link } from 'react-router-dom'
import type { InvoiceRow } from '../../../shared/api/reports.ts'
import { currencySign, formatAmount } from '../../lib/format.ts'
import type { Column } from '../ui/table/column.ts'
import { Two } from '../ui/table/two.tsx'
import { When } from '../ui/when.tsx'
import { invoiceStanding } from './invoice-standing.ts'

/** The columns of the list of invoices; `manyCustomers`: the row says whose it is. */
export function invoiceColumns({ currency, manyCustomers }: { currency: string; manyCustomers: boolean }): Column<InvoiceRow>[] {
  return [
    { id: 'number', head: 'Invoice', card: 'start', nowrap: true, value: ({ number }) => number, cell: ({ id, number, jobId, jobNumber }) => <><Link to={`/invoices/${id}`} className="mono inline-block font-medium leading-6">{number}</Link><Two>for <Link to={`/jobs/${jobId}`} className="mono">{jobNumber}</Link></Two></> },
    ...(manyCustomers ? [{ id: 'customer', head: 'Customer', value: ({ customerName }: InvoiceRow) => customerName, cell: ({ customerName }: InvoiceRow) => customerName }] : []),
    { id: 'order', head: 'Order', value: ({ purchaseOrder }) => purchaseOrder, cell: ({ purchaseOrder }) => purchaseOrder || <span className="text-quiet">none</span> },
    { id: 'what', head: 'For', sort: false, value: ({ lines }) => lines.map(({ name, count }) => `${count} × ${name}`).join(', '), cell: ({ lines }) => lines.map(({ name, count }) => `${count} × ${name}`).join(', ') },
    { id: 'issued', head: 'Issued', card: 'end', nowrap: true, value: ({ issuedOn }) => issuedOn, cell: ({ issuedOn }) => <When at={issuedOn} /> },
    { id: 'net', head: 'Before tax', unit: currencySign(currency), numeric: true, card: 'none', value: ({ netMinor }) => netMinor / 100, cell: (row) => formatAmount(row.netMinor, row.currency) },
    { id: 'total', head: 'Total', unit: currencySign(currency), numeric: true, card: 'foot-start', nowrap: true, value: ({ totalMinor }) => totalMinor / 100, cell: (row) => <><span className="text-quiet list:hidden">{currencySign(row.currency)} </span>{formatAmount(row.totalMinor, row.currency)}<Two>{invoiceStanding(row)}</Two></> },
  ]
}
