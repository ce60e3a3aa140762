import { useQuery, keepPreviousData } from '@tanstack/react-query'
import { useEffect, useState } from 'react'
import { useSearchParams } from 'react-router-dom'
import type { Floor } from '../../../shared/api/benches.ts'
import { floorQuery } from '../../api/benches.ts'
import { catalogueQuery } from '../../api/catalogue.ts'
import { useMe } from '../../api/session.ts'
import { FloorGrid } from '../../components/floor/floor-grid.tsx'
import { FloorLegend } from '../../components/floor/floor-legend.tsx'
import { UnplacedList } from '../../components/floor/unplaced-list.tsx'
import { useKeys } from '../../components/ui/buttons/use-keys.ts'
import { Note } from '../../components/ui/feedback/note.tsx'
import { SelectField } from '../../components/ui/fields/select-field.tsx'
import { Live } from '../../components/ui/live.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { formatDay, formatTime, formatWhen, isSameDay } from '../../lib/format.ts'
import { useLiveState } from '../../lib/live.ts'

const dayChoices = [{ value: '1', label: 'One day' }, { value: '3', label: 'Three days' }, { value: '5', label: 'Five days' }, { value: '10', label: 'Ten days' }]

/** The load of the sites: benches against days, as the plan has them now. */
export function FloorPage() {
  const me = useMe()
  const [address, setAddress] = useSearchParams()
  const siteId = me.siteIds.find((id) => id === address.get('site'))
  const days = dayChoices.find(({ value }) => value === address.get('days'))?.value ?? '5'
  const floor = useQuery({ ...floorQuery({ siteId, days: Number(days) }), placeholderData: keepPreviousData })
  const sites = useQuery(catalogueQuery).data?.sites.filter(({ id }) => me.siteIds.includes(id)) ?? []
  const live = useLiveState()
  const now = useNow()
  const choose = (name: string, value: string) => setAddress((before) => {
    const next = new URLSearchParams(before)
    if (value) next.set(name, value)
    else next.delete(name)
    return next
  }, { replace: true })
  // The strip that has the focus says why, as Enter does.
  useKeys({ w: () => document.activeElement instanceof HTMLElement && document.activeElement.matches('[data-strip]') && document.activeElement.click() })
  return (
    <div className="px-gutter pt-7 pb-16 max-tablet:pt-5">
      <title>Floor · Crosshead</title>
      <PageTitle
        title={floor.data ? `Floor, ${daysWords(floor.data.days)}` : 'Floor'}
        actions={
          <>
            <Live at={floor.data?.madeAt ?? undefined} zone={me.timeZone} broken={!live.connected && live.lastAt !== null}>{floor.data && (floor.data.madeAt ? `plan of ${madeWords(floor.data.madeAt, me.timeZone, now)}` : 'no plan yet')}</Live>
            {sites.length > 1 && <SelectField label="Sites" labelHidden className="w-40" choices={[{ value: '', label: 'All sites' }, ...sites.map(({ id, name }) => ({ value: id, label: name }))]} value={siteId ?? ''} onChange={(event) => choose('site', event.target.value)} />}
            <SelectField label="Days" labelHidden className="w-36" choices={dayChoices} value={days} onChange={(event) => choose('days', event.target.value === '5' ? '' : event.target.value)} />
          </>
        }
      />
      <QueryState query={floor} what="the floor" empty={{ when: ({ sites: shown }) => shown.length === 0, title: 'No benches here', text: 'The floor shows the benches of a site. Yours has none on record.' }}>
        {(data) => (
          <>
            {data.unplaced.length > 0 && <Note kind="warn" className="mb-4" title={data.unplaced.length === 1 ? 'One step has no place.' : `${data.unplaced.length} steps have no place.`}><a href="#no-place">See why and what would help</a></Note>}
            <FloorLegend />
            <div aria-busy={floor.isPlaceholderData}><FloorGrid floor={data} now={now} /></div>
            <UnplacedList unplaced={data.unplaced} />
          </>
        )}
      </QueryState>
    </div>
  )
}

function daysWords(days: Floor['days']): string {
  const [first, last] = [days[0]?.day, days.at(-1)?.day]
  if (!first || !last) return ''
  return first === last ? formatDay(first, 'long') : `${formatDay(first)} to ${formatDay(last)}`
}

function madeWords(at: string, zone: string, now: Date): string {
  return isSameDay(at, now, zone) ? formatTime(at, { zone }) : formatWhen(at, 'week', { zone })
}

/** The time, a minute at a time. */
function useNow(): Date {
  const [now, setNow] = useState(() => new Date())
  useEffect(() => {
    const timer = setInterval(() => setNow(new Date()), 60_000)
    return () => clearInterval(timer)
  }, [])
  return now
}
