import { Link } from 'react-router-dom'
import type { SampleRow } from '../../../shared/api/samples.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { Flag } from '../ui/traveller/flag.tsx'
import { State } from '../ui/traveller/state.tsx'

/** The samples of a job as they were announced; the chosen one is received beside it. */
export function ParcelList({ samples, chosen }: { samples: readonly SampleRow[]; chosen: string | undefined }) {
  return (
    <ol aria-label="Samples of the job" className="border-t border-ink">
      {samples.map((sample) => (
        <li key={sample.id} className="border-b border-line">
          <Link to={`/receive?job=${sample.jobId}&sample=${sample.id}`} aria-current={sample.id === chosen ? 'true' : undefined} className="-mx-3.5 grid min-h-touch grid-cols-[minmax(0,1fr)_auto] items-center gap-x-4 px-3.5 py-2.5 no-underline hover:bg-wash aria-[current]:bg-sheet aria-[current]:shadow-[inset_3px_0_var(--ink)]">
            <span className="min-w-0">
              <b className="mono">{sample.number}</b>
              <span className="ml-3">{[sample.material, `${sample.piece.form} ${sizeText(sample.piece)}`.trim()].filter(Boolean).join(', ')}</span>
              <span className="two">{[sample.heat && `heat ${sample.heat}`, sample.lot && `lot ${sample.lot}`, sample.tests].filter(Boolean).join(', ')}</span>
            </span>
            <span className="grid justify-items-end gap-1 text-13"><State state={sample.state} />{sample.onHold && <Flag>on hold</Flag>}</span>
          </Link>
        </li>
      ))}
    </ol>
  )
}
