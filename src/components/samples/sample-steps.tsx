import { useState } from 'react'
import { Link } from 'react-router-dom'
import type { StepInSample } from '../../../shared/api/samples.ts'
import { Button } from '../ui/buttons/button.tsx'
import { PlainTable } from '../ui/table/plain-table.tsx'
import type { Column } from '../ui/table/column.ts'
import { Two } from '../ui/table/two.tsx'
import { State } from '../ui/traveller/state.tsx'
import { When } from '../ui/when.tsx'

/** The steps of a sample for its lab: where and when each was or will be done, by whom, why there and then, and what was ruled out. */
export function SampleSteps({ steps, zone, mayOpenBench }: { steps: readonly StepInSample[]; zone: string; mayOpenBench: boolean }) {
  const columns: readonly Column<StepInSample>[] = [
    { id: 'label', head: 'Step', nowrap: true, cell: ({ label, state }) => <><b>{label}</b><Two><State state={state} className="text-13" /></Two></> },
    { id: 'bench', head: 'Bench', cell: ({ benchId, benchName, personName }) => benchName && <>{mayOpenBench && benchId ? <Link to={`/bench/${benchId}`}>{benchName}</Link> : benchName}<Two>{personName}</Two></> },
    { id: 'when', head: 'When', nowrap: true, cell: (step) => <StepTime step={step} zone={zone} /> },
    { id: 'why', head: 'Why there and then', share: 45, cell: (step) => <Why step={step} /> },
  ]
  return <PlainTable caption="Steps" columns={columns} rows={steps} rowId={({ id }) => id} />
}

function StepTime({ step: { startedAt, endedAt, plannedStart, plannedEnd }, zone }: { step: StepInSample; zone: string }) {
  if (endedAt) return <><When at={endedAt} show="both" day="short" zone={zone} /><Two>done</Two></>
  if (startedAt) return <><When at={startedAt} show="both" day="short" zone={zone} /><Two>since then</Two></>
  if (plannedStart) return <><When at={plannedStart} show="both" day="short" zone={zone} /><Two>{plannedEnd && <>until <When at={plannedEnd} show="both" day="short" zone={zone} /></>}</Two></>
  return <span className="text-quiet">not planned</span>
}

function Why({ step: { why, rejected, unplacedBecause, label } }: { step: StepInSample; }) {
  const [open, setOpen] = useState(false)
  if (unplacedBecause) return <span className="text-amber">{unplacedBecause}</span>
  return (
    <>
      {why}
      {rejected.length > 0 && <Button kind="bare" size="tiny" className="-ml-2" aria-expanded={open} aria-label={`What was ruled out for ${label}`} onClick={() => setOpen(!open)}>{rejected.length} ruled out</Button>}
      {open && <ul className="mt-1 text-13 text-quiet">{rejected.map(({ bench, because }) => <li key={`${bench} ${because}`}><b>{bench}:</b> {because}</li>)}</ul>}
    </>
  )
}
