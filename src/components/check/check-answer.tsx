import type { ReactNode } from 'react'
import type { ReportCheck } from '../../../shared/api/reports.ts'
import { formatDay } from '../../lib/format.ts'
import type { IconName } from '../ui/icon.tsx'
import { SideSection } from '../ui/side-section.tsx'
import { TravellerLine, type LineNode } from '../ui/traveller/traveller-line.tsx'
import { BigAnswer } from './big-answer.tsx'
import { CompareFile } from './compare-file.tsx'

type Answer = ReportCheck['answer']
const looks: Record<Answer, { look: 'good' | 'caution' | 'bad'; icon: IconName; title: string }> = {
  'genuine and current': { look: 'good', icon: 'check', title: 'Genuine and current' },
  superseded: { look: 'caution', icon: 'warning', title: 'Superseded' },
  withdrawn: { look: 'bad', icon: 'cross', title: 'Withdrawn' },
  unknown: { look: 'bad', icon: 'stop', title: 'Unknown' },
}

/** What is on record of a report; nothing about whose it is. */
export function CheckAnswer({ check }: { check: ReportCheck }) {
  const look = looks[check.answer]
  return (
    <>
      <section aria-live="polite" aria-label="Answer" className="mb-12">
        <BigAnswer look={look.look} icon={look.icon} title={look.title}><p><Sentence check={check} /></p></BigAnswer>
      </section>
      {check.revisions.length > 0 && (
        <SideSection title="Revisions">
          <div className="[&_.tl>*:last-child]:min-w-28">
            <TravellerLine size="m" nodes={check.revisions.map((revision, place) => revisionNode(revision, check.revisions[place + 1]))} />
          </div>
        </SideSection>
      )}
      {check.sha256 && <CompareFile key={check.number} onRecord={check.sha256} />}
      {check.answer !== 'unknown' && <p className="border-t border-line pt-3.5 text-quiet">Results are not shown here; they are in the report itself.</p>}
    </>
  )
}

function Sentence({ check: { answer, number, company, issuedAt, revisions } }: { check: ReportCheck }): ReactNode {
  const issued = <>{company} issued report <span className="mono">{number}</span>{issuedAt && ` on ${formatDay(issuedAt, 'full')}`}.</>
  const current = revisions.find((revision) => revision.state === 'current')
  switch (answer) {
    case 'genuine and current':
      return <>{issued} Nothing has replaced or withdrawn it.</>
    case 'superseded':
      return <>{issued} It no longer counts: {current ? <>revision <span className="mono">{current.number}</span>{current.issuedAt && ` of ${formatDay(current.issuedAt, 'full')}`} has taken its place.</> : 'a later revision has taken its place.'} Ask whoever gave it to you for the newer one.</>
    case 'withdrawn':
      return <>{issued} It has been withdrawn since and must not be used. Ask {company} why.</>
    case 'unknown':
      return <>{company} has no report with this number and this code. Look at both on its first page once more; if they are as printed there, it was not issued here.</>
  }
}

function revisionNode({ number, state, issuedAt }: ReportCheck['revisions'][number], next: ReportCheck['revisions'][number] | undefined): LineNode {
  const words = { 'being made': 'being made', current: 'current', superseded: next ? `superseded by ${shortNumber(next.number)}` : 'superseded', withdrawn: 'withdrawn' }
  return {
    kind: 'report', stage: 'reported', label: shortNumber(number), state: state === 'current' ? 'done' : state === 'being made' ? 'now' : 'void',
    note: issuedAt ? formatDay(issuedAt, 'full') : undefined, place: words[state],
  }
}

/** "/2" of "R-26-00391/2". */
function shortNumber(number: string): string {
  return number.includes('/') ? number.slice(number.lastIndexOf('/')) : number
}
