import { Link } from 'react-router-dom'
import type { SampleRow } from '../../../shared/api/samples.ts'
import { SampleState } from '../../../shared/api/words.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import type { Column } from '../ui/table/column.ts'
import { Two } from '../ui/table/two.tsx'
import { Flag } from '../ui/traveller/flag.tsx'
import { State, stateLabel } from '../ui/traveller/state.tsx'
import { When } from '../ui/when.tsx'

/** The columns of the list of samples; `manyCustomers`: the row says whose it is. */
export function sampleColumns({ zone, manyCustomers }: { zone: string; manyCustomers: boolean }): Column<SampleRow>[] {
  return [
    {
      id: 'search', head: 'Sample', name: 'Sample', sort: false, card: 'start', nowrap: true, value: ({ number }) => number, filter: { kind: 'text', words: 'number, heat, lot, code' },
      cell: ({ id, number, jobId, jobNumber }) => <><Link to={`/samples/${id}`} className="mono inline-block font-medium leading-6">{number}</Link><Two>of <Link to={`/jobs/${jobId}`} className="mono">{jobNumber}</Link></Two></>,
    },
    ...(manyCustomers ? [{ id: 'customer', head: 'Customer', sort: false, value: ({ customerName }: SampleRow) => customerName, cell: ({ customerName, siteName }: SampleRow) => <>{customerName}<Two>{siteName}</Two></> }] : []),
    { id: 'heat', head: 'Heat and lot', sort: false, value: ({ heat, lot }) => [heat, lot].filter(Boolean).join(' / '), cell: ({ heat, lot }) => <><span className="mono">{heat || '–'}</span><Two>{lot ? <>lot <span className="mono">{lot}</span></> : 'no lot'}</Two></> },
    { id: 'material', head: 'Material', sort: false, value: ({ material, piece }) => [material, piece.form, sizeText(piece)].filter(Boolean).join(' '), cell: ({ material, piece }) => <>{material}<Two>{piece.form} {sizeText(piece)}</Two></> },
    { id: 'tests', head: 'Tests', sort: false, value: ({ tests }) => tests, cell: ({ tests }) => tests },
    {
      id: 'state', head: 'State', sort: false, card: 'end', value: ({ state }) => state, filter: { kind: 'choice', all: 'all states', choices: SampleState.options.map((value) => ({ value, label: stateLabel(value) })) },
      cell: ({ state, onHold, now }) => <><State state={state} /><Two>{onHold ? <Flag>on hold</Flag> : now}</Two></>,
    },
    { id: 'received', head: 'Received', sort: false, card: 'none', nowrap: true, value: ({ receivedAt }) => receivedAt, cell: ({ receivedAt, condition }) => receivedAt && <><When at={receivedAt} zone={zone} /><Two>{condition}</Two></> },
  ]
}
