import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { Bench } from '../../../shared/api/benches.ts'
import { benchesQuery, queueQuery } from '../../api/benches.ts'
import { useMe } from '../../api/session.ts'
import { Machine } from '../../components/bench/sheet-head.tsx'
import { myBench } from '../../components/bench/my-bench.ts'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { SectionHead } from '../../components/ui/section-head.tsx'

/** Where I work today: the benches of my site with what waits at each. */
export function BenchesPage() {
  const me = useMe()
  const benches = useQuery(benchesQuery)
  return (
    <>
      <PageTitle title="Choose your bench" under={<span>{me.place}. This browser remembers the one you opened last.</span>} />
      <QueryState query={benches} what="the benches" empty={{ when: ({ items }) => items.length === 0, title: 'No benches here', text: 'Nobody has set up benches at your site yet.' }}>
        {({ items }) => [...new Set(items.map(({ siteName }) => siteName))].map((site) => (
          <section key={site} className="mb-8" aria-label={site}>
            <SectionHead title={site} aside={`${items.filter(({ siteName }) => siteName === site).length} benches`} />
            <ul className="grid grid-cols-[repeat(auto-fill,minmax(min(100%,300px),1fr))] gap-3">
              {items.filter(({ siteName }) => siteName === site).map((bench) => <OneBench key={bench.id} bench={bench} />)}
            </ul>
          </section>
        ))}
      </QueryState>
    </>
  )
}

function OneBench({ bench }: { bench: Bench }) {
  const { data } = useQuery(queueQuery(bench.id))
  const here = data?.items.filter(({ isHere }) => isHere).length
  const isMine = myBench() === bench.id
  return (
    <li>
      <Link to={`/bench/${bench.id}`} className={`on-sheet block h-full border bg-sheet p-4 no-underline hover:bg-wash ${isMine ? 'border-ink shadow-[inset_4px_0_var(--ink)]' : 'border-line'}`}>
        <span className="flex items-baseline justify-between gap-3"><b className="text-17">{bench.name}</b><span className="mono text-13 text-quiet">{bench.code}</span></span>
        <span className="block text-quiet">{bench.does.map(({ label }) => label).join(', ')}</span>
        <span className="mt-1 block">{bench.out ? <span className="text-red">out of use</span> : data ? `${data.items.length} to do${here !== undefined && here < data.items.length ? `, ${here} here` : ''}` : ' '}{isMine && <span className="text-quiet">, yours last</span>}</span>
        {bench.equipment && <span className="mt-1 block text-13 text-quiet"><Machine equipment={bench.equipment} zone={data?.timeZone ?? 'UTC'} /></span>}
      </Link>
    </li>
  )
}
