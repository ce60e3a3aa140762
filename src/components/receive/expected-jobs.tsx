import { Link } from 'react-router-dom'
import type { SampleRow } from '../../../shared/api/samples.ts'
import { SideSection } from '../ui/side-section.tsx'

/** Jobs whose samples are still to come, newest first, with how many. */
export function ExpectedJobs({ samples, chosen }: { samples: readonly SampleRow[]; chosen: string | undefined }) {
  const jobs = [...new Map(samples.map((sample) => [sample.jobId, sample])).values()]
  return (
    <SideSection title="Expected" aside={jobs.length > 0 ? `${jobs.length} ${jobs.length === 1 ? 'job' : 'jobs'}` : undefined}>
      {jobs.length === 0 && <p className="text-quiet">Nothing is on its way here.</p>}
      <ul>
        {jobs.map(({ jobId, jobNumber, customerName }) => {
          const count = samples.filter((sample) => sample.jobId === jobId).length
          return (
            <li key={jobId} className="border-b border-line">
              <Link to={`/receive?job=${jobId}`} aria-current={jobId === chosen ? 'true' : undefined} className="-mx-3 flex min-h-touch items-center justify-between gap-3 px-3 py-2 no-underline hover:bg-wash aria-[current]:bg-sheet aria-[current]:shadow-[inset_3px_0_var(--ink)]">
                <span><b className="mono">{jobNumber}</b><span className="two">{customerName}</span></span>
                <span className="whitespace-nowrap text-quiet">{count} {count === 1 ? 'sample' : 'samples'}</span>
              </Link>
            </li>
          )
        })}
      </ul>
    </SideSection>
  )
}
