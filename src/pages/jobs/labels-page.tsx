import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { labelsQuery } from '../../api/jobs.ts'
import { SampleLabel } from '../../components/jobs/print/sample-label.tsx'
import { Button } from '../../components/ui/buttons/button.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'

/** Labels for the samples of a job, 62 × 29 mm each, to print and to stick on. */
export function LabelsPage() {
  const { jobId = '' } = useParams()
  const labels = useQuery(labelsQuery(jobId))
  return (
    <QueryState query={labels} what="the labels">
      {(found) => (
        <>
          <div className="not-printed">
            <PageTitle
              crumb={{ to: `/jobs/${jobId}`, label: found.jobNumber }} title={<>Labels of <span className="mono">{found.jobNumber}</span></>}
              under={<span>{found.labels.length === 1 ? '1 label' : `${found.labels.length} labels`} of 62 × 29 mm: on a label roll one each, on A4 three in a row. One on each sample, where it is not cut.</span>}
              actions={<Button kind="main" icon="print" onClick={() => window.print()}>Print</Button>}
            />
          </div>
          <div className="flex flex-wrap gap-[3mm] print:gap-[1mm]">
            {found.labels.map((label) => <SampleLabel key={label.number} label={label} customerName={found.customerName} />)}
          </div>
        </>
      )}
    </QueryState>
  )
}
