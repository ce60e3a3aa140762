import type { ReactNode } from 'react'
import { Link } from 'react-router-dom'
import type { FloorStrip } from '../../../shared/api/benches.ts'
import { asSentence } from '../../lib/refused-field.ts'
import { sampleList, stripStates, stripTime } from './strip-words.ts'

/** What a strip is, why it stands here and then, and which benches were not taken. */
export function StripWhy({ strip, zone, bench }: { strip: FloorStrip; zone: string; bench: string }) {
  const { jobId, jobNumber, label, sampleNumbers, person, why, rejected, state, stage } = strip
  return (
    <div className="text-13/5">
      <p className="mono text-[0.875rem]! font-medium break-words">{sampleList(jobNumber, sampleNumbers)}</p>
      <p className="mt-1 mb-2 text-quiet">{label}, {stripTime(strip, zone)}, {stripStates[state]}{stage === 'in work' ? '' : `, job ${stage}`}</p>
      <dl className="grid grid-cols-[68px_minmax(0,1fr)] gap-x-3 gap-y-1.5">
        {why && <Line name="Why so">{asSentence(why)}</Line>}
        <Line name={state === 'planned' ? 'Planned' : 'By'}>{[bench, person].filter(Boolean).join(', ')}</Line>
        {rejected.length > 0 && (
          <Line name="Not there"><ul>{rejected.map((one) => <li key={one.bench}><b>{one.bench}</b><span className="text-quiet">: {one.because}</span></li>)}</ul></Line>
        )}
      </dl>
      <p className="mt-2.5"><Link to={`/jobs/${jobId}`}>Job {jobNumber}</Link></p>
    </div>
  )
}

function Line({ name, children }: { name: string; children: ReactNode }) {
  return <><dt className="font-bold">{name}</dt><dd className="min-w-0">{children}</dd></>
}
