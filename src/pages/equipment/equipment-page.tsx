import { useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import type { EquipmentState } from '../../../shared/api/benches.ts'
import { equipmentQuery } from '../../api/benches.ts'
import { useMe } from '../../api/session.ts'
import type { Span } from '../../components/equipment/due-track.tsx'
import { equipmentColumns } from '../../components/equipment/equipment-columns.tsx'
import { equipmentStanding } from '../../components/equipment/equipment-standing.ts'
import { Live } from '../../components/ui/live.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { CsvButton } from '../../components/ui/table/csv-button.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'
import { calendarDay } from '../../lib/format.ts'
import { useLiveState } from '../../lib/live.ts'

/** Machines with their calibration and newest verification: what may be measured with, and what falls due next. */
export function EquipmentPage() {
  const me = useMe()
  const equipment = useQuery(equipmentQuery)
  const live = useLiveState()
  const today = calendarDay(new Date(), me.timeZone)
  const items = useMemo(() => [...(equipment.data?.items ?? [])].sort((a, b) => a.siteName.localeCompare(b.siteName) || (a.calibratedUntil ?? '').localeCompare(b.calibratedUntil ?? '')), [equipment.data])
  const columns = useMemo(() => equipmentColumns(items, spanOf(items, today)), [items, today])
  const standings = items.map((item) => equipmentStanding(item, today).level)
  const count = (level: string) => standings.filter((one) => one === level).length
  return (
    <>
      <title>Equipment · Crosshead</title>
      <PageTitle
        title="Equipment"
        under={equipment.data && <><span>{me.place}</span><span>{items.length === 1 ? '1 machine' : `${items.length} machines`}</span><span>{count('bad') === 0 ? 'all may be measured with' : `${count('bad')} may not be measured with`}</span>{count('soon') > 0 && <span>{count('soon')} due within four weeks</span>}</>}
        actions={<><Live at={equipment.dataUpdatedAt} broken={!live.connected && live.lastAt !== null} />{items.length > 0 && <CsvButton columns={columns} rows={items} name="equipment" />}</>}
      />
      <QueryState query={equipment} what="the equipment">
        {() => (
          <DataTable
            caption="Equipment" columns={columns} rows={items} rowId={({ id }) => id} more={{ total: items.length, noun: 'machines' }}
            empty={{ title: 'No equipment here', text: 'Machines belong to a site; none is on record at yours.' }}
          />
        )}
      </QueryState>
    </>
  )
}

const dayMs = 86_400_000
const shift = (day: string, days: number) => new Date(Date.parse(day) + days * dayMs).toISOString().slice(0, 10)

/** From a month ago to the last day that is due, at most fifteen months away. */
function spanOf(items: readonly EquipmentState[], today: string): Span {
  const due = items.flatMap(({ calibratedUntil }) => calibratedUntil ?? []).sort()
  const last = due.at(-1) ?? today
  const far = shift(today, 456)
  return { today, from: shift(today, -31), to: shift(last > far ? far : last < shift(today, 90) ? shift(today, 90) : last, 14) }
}
