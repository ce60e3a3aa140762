import { Link } from 'react-router-dom'
import type { Floor } from '../../../shared/api/benches.ts'
import { asSentence } from '../../lib/refused-field.ts'
import { SideSection } from '../ui/side-section.tsx'
import type { Column } from '../ui/table/column.ts'
import { PlainTable } from '../ui/table/plain-table.tsx'

type Unplaced = Floor['unplaced'][number]

const columns: Column<Unplaced>[] = [
  { id: 'sample', head: 'Sample', nowrap: true, cell: ({ sampleNumber, jobId }) => <Link to={`/jobs/${jobId}`} className="mono">{sampleNumber}</Link> },
  { id: 'step', head: 'Step', nowrap: true, cell: ({ label }) => label },
  { id: 'because', head: 'Why it has no place', cell: ({ because }) => asSentence(because) },
  { id: 'cures', head: 'What would help', cell: ({ cures }) => (cures.length > 0 ? cures.map((cure) => <span key={cure} className="block">{asSentence(cure)}</span>) : <span className="text-quiet">nothing that the plan knows of</span>) },
]

/** Steps that the plan could not put anywhere, with the reason and what would help. */
export function UnplacedList({ unplaced }: { unplaced: Floor['unplaced'] }) {
  return (
    <SideSection className="mt-8" title={<span id="no-place">Without a place</span>} aside={unplaced.length === 1 ? '1 step' : `${unplaced.length} steps`}>
      {unplaced.length === 0 ? <p className="text-quiet">Every step that is to come has its bench and its time.</p> : <PlainTable caption="Steps without a place" columns={columns} rows={unplaced} rowId={({ stepId }) => stepId} />}
    </SideSection>
  )
}
