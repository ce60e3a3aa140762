import { useInfiniteQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import { samplesQuery } from '../../api/samples.ts'
import { SideSection } from '../ui/side-section.tsx'
import { Flag } from '../ui/traveller/flag.tsx'
import { When } from '../ui/when.tsx'

const most = 10

/** What came in last, with its condition. */
export function RecentlyReceived() {
  const received = useInfiniteQuery(samplesQuery({ state: 'received' }))
  const inWork = useInfiniteQuery(samplesQuery({ state: 'in work' }))
  const samples = [received, inWork].flatMap(({ data }) => data?.pages.flatMap(({ items }) => items) ?? []).filter(({ receivedAt }) => receivedAt !== null)
    .sort((a, b) => (b.receivedAt ?? '').localeCompare(a.receivedAt ?? '')).slice(0, most)
  return (
    <SideSection title="Recently received">
      {samples.length === 0 && <p className="text-quiet">Nothing yet.</p>}
      <ul>
        {samples.map(({ id, number, condition, receivedAt, onHold }) => (
          <li key={id} className="flex items-baseline justify-between gap-3 border-b border-line py-2">
            <span className="min-w-0"><Link to={`/samples/${id}`} className="mono">{number}</Link><span className="two">{condition}</span>{onHold && <Flag>on hold</Flag>}</span>
            {receivedAt && <When at={receivedAt} show="both" day="short" className="text-13 text-quiet" />}
          </li>
        ))}
      </ul>
    </SideSection>
  )
}
