import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { labelsQuery } from '../../api/jobs.ts'
import { PackingSlip } from '../../components/jobs/print/packing-slip.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'

/** What goes into the parcel: where to, from whom, and each sample with its code. */
export function PackingSlipPage() {
  const { jobId = '' } = useParams()
  const labels = useQuery(labelsQuery(jobId))
  return (
    <QueryState query={labels} what="the packing slip">
      {(found) => (
        <>
          <div className="not-printed">
            <PageTitle
              crumb={{ to: `/jobs/${jobId}`, label: found.jobNumber }} title={<>Packing slip of <span className="mono">{found.jobNumber}</span></>} under={<span>One copy into each parcel; receiving scans its code.</span>}
              actions={<Button kind="main" icon="print" onClick={() => window.print()}>Print</Button>}
            />
          </div>
          <PackingSlip slip={found} />
        </>
      )}
    </QueryState>
  )
}
