import type { TestRun } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { formatDay, formatTime, formatWhen } from '../../lib/format.ts'
import { Pairs } from '../ui/pairs.tsx'
import { SideSection } from '../ui/side-section.tsx'

/** With what and on what it was run. */
export function RunFacts({ run }: { run: TestRun }) {
  const { equipment, timeZone } = run
  const verified = equipment?.lastVerification
  const items: [string, string][] = [
    ['Asked for', methodOf(run.methodId)?.summary(run.parameters) ?? run.methodId],
    ['Heat, lot', [run.heat, run.lot].filter(Boolean).join(', ') || 'not given'],
    ['Bench', `${run.benchName}, ${run.siteName}`],
    ...(equipment ? [
      ['Machine', `${equipment.code}, ${equipment.name}${equipment.outOfUse ? ', out of use now' : ''}`],
      ['Calibration', equipment.calibratedUntil ? [equipment.certificate, `until ${formatDay(equipment.calibratedUntil, 'full')}`].filter(Boolean).join(', ') : 'none on record'],
      ['Verification', verified ? `${verified.passed ? 'passed' : 'failed'} ${formatWhen(verified.at, 'week', { zone: timeZone })}${verified.text ? `: ${verified.text}` : ''}` : 'none on record'],
    ] satisfies [string, string][] : []),
    ['Customer', [run.customerName, run.purchaseOrder].filter(Boolean).join(', order ')],
    ['Recorded', run.recordedAt ? formatWhen(run.recordedAt, 'week', { zone: timeZone }) : `still open, begun ${formatTime(run.startedAt, { zone: timeZone })}`],
  ]
  return <SideSection className="mb-6.5" title="Machine, bench, order"><Pairs items={items} className="text-13" /></SideSection>
}
