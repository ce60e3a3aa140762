import type { EquipmentState } from '../../../shared/api/benches.ts'
import { formatDay, formatWhen } from '../../lib/format.ts'
import { Icon } from '../ui/icon.tsx'
import { Met } from '../ui/limits/met.tsx'
import type { Column } from '../ui/table/column.ts'
import { Two } from '../ui/table/two.tsx'
import { DueTicks, DueTrack, type Span } from './due-track.tsx'
import { equipmentStanding } from './equipment-standing.ts'

export function equipmentColumns(items: readonly EquipmentState[], span: Span): Column<EquipmentState>[] {
  const choices = (of: (item: EquipmentState) => string) => [...new Set(items.map(of))].sort().map((value) => ({ value, label: value }))
  const sites = choices(({ siteName }) => siteName)
  return [
    { id: 'machine', head: 'Equipment', card: 'start', value: ({ code, name }) => `${code} ${name}`, filter: { kind: 'text', words: 'code or name' }, cell: ({ code, name }) => <><b className="mono">{code}</b><Two>{name}</Two></> },
    { id: 'site', head: 'Site', card: 'foot-start', nowrap: true, value: ({ siteName }) => siteName, ...(sites.length > 1 && { filter: { kind: 'choice', all: 'all', choices: sites } }), cell: ({ siteName }) => siteName },
    { id: 'kind', head: 'Kind', card: 'none', hidden: true, value: ({ kind }) => kind, filter: { kind: 'choice', all: 'all', choices: choices(({ kind }) => kind) }, cell: ({ kind }) => kind },
    { id: 'standing', head: 'State', card: 'end', value: (item) => equipmentStanding(item, span.today).words, sort: false, cell: (item) => <StandingWords item={item} today={span.today} /> },
    { id: 'due', head: 'Calibrated until', card: 'wide', cardHead: 'calibrated until', value: ({ calibratedUntil }) => calibratedUntil, cell: ({ calibratedUntil, certificate }) => <><span className="whitespace-nowrap">{calibratedUntil ? formatDay(calibratedUntil, 'full') : 'never'}</span>{certificate && <Two><span className="mono">{certificate}</span></Two>}</> },
    { id: 'track', head: <DueTicks span={span} />, name: 'Time left', card: 'none', share: 26, cell: ({ calibratedUntil }) => calibratedUntil && <DueTrack due={calibratedUntil} span={span} /> },
    {
      id: 'verified', head: 'Last verification', card: 'wide', value: ({ lastVerification }) => lastVerification?.at,
      cell: ({ lastVerification: last }) => (last ? <><Met outcome={last.passed ? 'pass' : 'fail'}>{last.passed ? 'passed' : 'failed'}, {formatWhen(last.at, 'week')}</Met><Two>{last.text}</Two></> : <span className="text-quiet">none on record</span>),
    },
  ]
}

function StandingWords({ item, today }: { item: EquipmentState; today: string }) {
  const { level, words } = equipmentStanding(item, today)
  if (level === 'good') return <>{words}</>
  return <span className={`inline-flex items-start gap-1.5 font-medium ${level === 'bad' ? 'text-red' : 'text-amber'}`}><Icon name={level === 'bad' ? 'stop' : 'warning'} className="mt-0.75" />{words}</span>
}
