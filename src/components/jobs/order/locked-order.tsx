import type { Order } from '../../../../shared/api/orders.ts'
import { orderedTest } from '../../../../shared/orders/ordered-test.ts'
import { sizeText } from '../../../../shared/orders/size-text.ts'
import { SectionHead } from '../../ui/section-head.tsx'
import { PlainTable } from '../../ui/table/plain-table.tsx'
import type { Column } from '../../ui/table/column.ts'
import { Pairs } from '../../ui/pairs.tsx'
import { When } from '../../ui/when.tsx'

type Row = Order['samples'][number] & { place: number; labels: readonly string[] }

const columns: readonly Column<Row>[] = [
  { id: 'place', head: '', name: 'Row', cell: ({ place }) => <span className="text-quiet">{place}</span> },
  { id: 'heat', head: 'Heat', cell: ({ heat }) => <span className="mono">{heat}</span> },
  { id: 'lot', head: 'Lot', cell: ({ lot }) => <span className="mono">{lot}</span> },
  { id: 'material', head: 'Material', cell: ({ material }) => material },
  { id: 'piece', head: 'Form and size, mm', nowrap: true, cell: ({ piece }) => `${piece.form} ${sizeText(piece)}` },
  { id: 'tests', head: 'Tests', cell: ({ labels }) => labels.join(', ') },
]

/** An order to read: as it waits for its payment, or as the lab sees a draft. */
export function LockedOrder({ order }: { order: Order }) {
  const rows = order.samples.map((sample, at): Row => ({
    ...sample, place: at + 1, labels: order.columns.filter(({ key }) => sample.tests.includes(key)).map((column) => orderedTest(column, sample.overrides[column.key]).label),
  }))
  return (
    <>
      <Pairs className="mb-7" items={[['Purchase order', order.purchaseOrder || 'none given'], ['Needed by', order.neededBy ? <When key="at" at={order.neededBy} /> : 'no day given'], ['Samples afterwards', order.afterwards]]} />
      <SectionHead title={`Samples, ${rows.length}`} />
      <PlainTable caption="Samples of the order" columns={columns} rows={rows} rowId={({ place }) => String(place)} />
    </>
  )
}
