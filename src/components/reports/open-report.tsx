import { Link } from 'react-router-dom'
import type { ReportRow } from '../../../shared/api/reports.ts'
import { reportFile } from '../../api/reports.ts'
import { buttonLook } from '../ui/buttons/button-look.ts'
import { ButtonLink } from '../ui/buttons/button-link.tsx'
import { Icon } from '../ui/icon.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { SectionHead } from '../ui/section-head.tsx'
import { State } from '../ui/traveller/state.tsx'
import { When } from '../ui/when.tsx'
import { fullNumber } from './report-columns.tsx'

/** One report in full: its state, who signed it, where it was mailed, and what proves it genuine. */
export function OpenReport({ report, zone }: { report: ReportRow; zone: string }) {
  const { id, jobId, jobNumber, state, issuedAt, signedBy, mailedTo, mailedAt, code, sha256 } = report
  const number = fullNumber(report)
  return (
    <section aria-label={`Report ${number}`} className="on-sheet mb-8 border border-line bg-sheet p-5">
      <SectionHead title={<span className="mono">{number}</span>} aside={<State state={state} />} />
      <Pairs
        items={[
          ['Job', <Link key="job" to={`/jobs/${jobId}`} className="mono">{jobNumber}</Link>],
          ['Issued', issuedAt ? <><When at={issuedAt} show="both" zone={zone} />, signed by {signedBy}</> : 'being made'],
          ['Mailed', mailedTo && mailedAt ? <>to {mailedTo}, <When at={mailedAt} show="both" zone={zone} /></> : 'not yet'],
          ['Check code', <span key="code" className="mono">{code}</span>],
          ...(sha256 ? [['SHA-256 of the file', <span key="hash" className="mono wrap-anywhere">{sha256}</span>] as const] : []),
        ]}
      />
      <div className="mt-4 flex flex-wrap gap-3">
        {state !== 'being made' && <a href={reportFile(id)} className={buttonLook({ kind: 'main' })}><Icon name="download" />Download the PDF</a>}
        <ButtonLink kind="soft" to={`/check?number=${encodeURIComponent(number)}&code=${encodeURIComponent(code)}`}>Check that it is genuine</ButtonLink>
      </div>
    </section>
  )
}
