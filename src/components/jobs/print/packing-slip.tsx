import type * as z from 'zod'
import type { readLabels } from '../../../../shared/api/jobs.ts'
import { BrandMark } from '../../shell/brand-mark.tsx'
import { PlainTable } from '../../ui/table/plain-table.tsx'
import type { Column } from '../../ui/table/column.ts'
import { TravellerLine } from '../../ui/traveller/traveller-line.tsx'
import { CodePicture } from './code-picture.tsx'

type Slip = z.infer<typeof readLabels.response>
type Row = Slip['labels'][number]

const columns: readonly Column<Row>[] = [
  { id: 'code', head: '', name: 'Code', cell: ({ number, code }) => <CodePicture svg={code} label={`Code of ${number}`} className="size-[12mm] min-w-[12mm]" /> },
  { id: 'number', head: 'Sample', nowrap: true, cell: ({ number, heat, lot }) => <><b className="mono">{number}</b><span className="block text-13">{heat && <>heat <span className="mono">{heat}</span></>}{heat && lot && ', '}{lot && <>lot <span className="mono">{lot}</span></>}</span></> },
  { id: 'material', head: 'Material and size, mm', cell: ({ material, size }) => <>{material}<span className="block text-13">{size}</span></> },
  { id: 'tests', head: 'Tests and traveller', share: 45, cell: ({ tests, traveller }) => <>{tests.join(', ')}<span className="mt-1 block max-w-[280px]"><TravellerLine nodes={traveller} /></span></> },
  { id: 'packed', head: 'Packed', cell: ({ number }) => <span role="img" aria-label={`Tick when ${number} is packed`} className="mt-1 block size-[5mm] border border-ink" /> },
]

/** An A4 sheet, ink on white on screen as on paper. */
export function PackingSlip({ slip }: { slip: Slip }) {
  const { jobNumber, jobCode, customerName, purchaseOrder, siteName, siteAddress, afterwards, labels } = slip
  return (
    <article data-theme="light" aria-label={`Packing slip of ${jobNumber}`} className="on-sheet w-full max-w-[210mm] border border-line bg-sheet p-[14mm] text-ink max-tablet:p-4 print:max-w-none print:border-0 print:p-0">
      <header className="mb-8 flex items-start justify-between gap-6 max-tablet:flex-wrap">
        <div>
          <p className="mb-6 flex items-center gap-2 text-17 font-medium"><BrandMark /> Packing slip</p>
          <p className="text-13 text-quiet">To</p>
          <p className="text-17">{siteName}</p>
          <p className="whitespace-pre-line">{siteAddress}</p>
        </div>
        <div className="flex gap-5">
          <div className="text-right">
            <p className="mono text-20 font-medium">{jobNumber}</p>
            <p>{customerName}</p>
            {purchaseOrder && <p>purchase order {purchaseOrder}</p>}
            <p className="text-quiet">{labels.length === 1 ? '1 sample' : `${labels.length} samples`}</p>
          </div>
          <CodePicture svg={jobCode} label={`Code of ${jobNumber}`} className="size-[26mm]" />
        </div>
      </header>
      <PlainTable caption="Samples in the parcel" columns={columns} rows={labels} rowId={({ number }) => number} />
      <footer className="mt-8 grid grid-cols-2 gap-8 text-13 max-tablet:grid-cols-1">
        <p><b>Afterwards:</b> {afterwards}.</p>
        <p className="border-t border-ink pt-1">Packed by, on, in how many parcels</p>
      </footer>
    </article>
  )
}
