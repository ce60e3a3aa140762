import type { InvoiceRow } from '../../../shared/api/reports.ts'
import { currencySign, formatAmount, formatMoney } from '../../lib/format.ts'
import { BrandMark } from '../shell/brand-mark.tsx'
import type { Column } from '../ui/table/column.ts'
import { PlainTable } from '../ui/table/plain-table.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { When } from '../ui/when.tsx'
import { invoiceStanding } from './invoice-standing.ts'

type Line = InvoiceRow['lines'][number]

/** An invoice as an A4 sheet, ink on white on screen as on paper. */
export function InvoiceSheet({ invoice, company }: { invoice: InvoiceRow; company: string }) {
  const { number, jobNumber, customerName, customerAddress, purchaseOrder, issuedOn, currency, lines, netMinor, taxPercent, taxMinor, totalMinor, paidMinor, refundedMinor } = invoice
  const sign = currencySign(currency)
  const say = (minor: number) => formatAmount(minor, currency)
  const columns: readonly Column<Line>[] = [
    { id: 'name', head: 'For', share: 50, cell: ({ name }) => name },
    { id: 'count', head: 'Tests', numeric: true, cell: ({ count }) => count },
    { id: 'unit', head: 'Each', unit: sign, numeric: true, cell: ({ unitMinor }) => say(unitMinor) },
    { id: 'total', head: 'Amount', unit: sign, numeric: true, cell: ({ totalMinor: line }) => say(line) },
  ]
  return (
    <article data-theme="light" aria-label={`Invoice ${number}`} className="on-sheet w-full max-w-[210mm] border border-line bg-sheet p-[14mm] text-ink max-tablet:p-4 print:max-w-none print:border-0 print:p-0">
      <header className="mb-10 flex flex-wrap items-start justify-between gap-6">
        <div>
          <p className="mb-8 flex items-center gap-2 text-17 font-medium"><BrandMark /> {company}</p>
          <p className="text-13 text-quiet">Invoice to</p>
          <p className="text-17">{customerName}</p>
          <p className="whitespace-pre-line">{customerAddress}</p>
        </div>
        <div>
          <p className="mb-4 text-26 font-medium">Invoice <span className="mono">{number}</span></p>
          <Pairs items={[['Issued', <When key="on" at={issuedOn} day="full" />], ['Job', <span key="job" className="mono">{jobNumber}</span>], ['Purchase order', purchaseOrder || 'none given'], ['State', invoiceStanding(invoice)]]} />
        </div>
      </header>
      <PlainTable caption={`Lines of invoice ${number}`} columns={columns} rows={lines} rowId={({ name, unitMinor }) => `${name} ${unitMinor}`} />
      <Pairs
        look="ruled" sum className="mt-4 ml-auto w-full max-w-[300px]"
        items={[[`Before tax, ${sign}`, say(netMinor)], [`Tax ${taxPercent} %`, say(taxMinor)], [`Total, ${sign}`, say(totalMinor)]]}
      />
      <p className="mt-8 text-13">{paidMinor > 0 ? `${formatMoney(paidMinor, currency)} received by card.` : 'Not paid yet.'} {refundedMinor > 0 && `${formatMoney(refundedMinor, currency)} paid back.`}</p>
    </article>
  )
}
