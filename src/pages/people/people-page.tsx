import { useInfiniteQuery } from '@tanstack/react-query'
import { useCallback, useEffect, useMemo, useRef, type ReactNode } from 'react'
import { useNavigate, useSearchParams } from 'react-router-dom'
import { Role } from '../../../shared/api/words.ts'
import { peopleQuery } from '../../api/people.ts'
import { InviteForm } from '../../components/people/invite-form.tsx'
import { personColumns } from '../../components/people/person-columns.tsx'
import { PersonPanel } from '../../components/people/person-panel.tsx'
import { ButtonLink } from '../../components/ui/buttons/button-link.tsx'
import { IconButton } from '../../components/ui/buttons/icon-button.tsx'
import { PageTitle } from '../../components/ui/page-title.tsx'
import { QueryState } from '../../components/ui/query-state.tsx'
import { DataTable } from '../../components/ui/table/data-table.tsx'
import { useTableAddress } from '../../components/ui/table/use-table-address.ts'

const invite = 'invite'

/** Colleagues and clients: who they are, what they may do until when. */
export function PeoplePage() {
  const [address] = useSearchParams()
  const navigate = useNavigate()
  const { filters } = useTableAddress(['name', 'role'])
  const people = useInfiniteQuery(peopleQuery({ role: Role.safeParse(filters['role']).data, search: filters['name'] || undefined }))
  const rows = useMemo(() => people.data?.pages.flatMap(({ items }) => items) ?? [], [people.data])
  const chosen = address.get('person')
  const to = useCallback((person: string | null) => {
    const next = new URLSearchParams(address)
    if (person) next.set('person', person)
    else next.delete('person')
    return `?${next.toString()}`
  }, [address])
  const columns = useMemo(() => personColumns(to), [to])
  const person = rows.find(({ id }) => id === chosen)
  return (
    <>
      <title>People · Crosshead</title>
      <PageTitle title="People" under={<span>Who works here and who orders here, and what each may do until when.</span>} actions={<ButtonLink to={to(invite)} kind={chosen === invite ? 'soft' : 'main'} icon="plus">Invite a person</ButtonLink>} />
      <div className={chosen ? 'grid grid-cols-[minmax(0,1fr)_328px] items-start gap-12 max-wide:grid-cols-1 max-wide:gap-8' : undefined}>
        <div className="min-w-0">
          <QueryState query={people} what="the people">
            {() => (
              <DataTable
                server caption="People" columns={columns} rows={rows} rowId={({ id }) => id} current={chosen ?? undefined}
                empty={{ title: 'Nobody yet', text: 'Invite the people of your site, and the clients who order here.', action: <ButtonLink to={to(invite)} size="tiny">Invite a person</ButtonLink> }}
                more={{ noun: rows.length === 1 ? 'person' : 'people', busy: people.isFetchingNextPage, ...(people.hasNextPage && { onMore: () => void people.fetchNextPage() }) }}
              />
            )}
          </QueryState>
        </div>
        {chosen === invite && <Side title="Invite a person" closeTo={to(null)}><InviteForm onDone={(id) => void navigate(to(id))} /></Side>}
        {person && <Side key={person.id} title={person.name} closeTo={to(null)}><PersonPanel person={person} /></Side>}
      </div>
    </>
  )
}

/** Beside the list, or over it on narrower screens; it takes the focus when it opens. */
function Side({ title, closeTo, children }: { title: string; closeTo: string; children: ReactNode }) {
  const navigate = useNavigate()
  const head = useRef<HTMLHeadingElement>(null)
  useEffect(() => {
    head.current?.focus({ preventScroll: true })
    head.current?.scrollIntoView?.({ block: 'nearest' })
  }, [])
  return (
    <aside aria-label={title} className="on-sheet border border-line bg-sheet p-5 max-wide:order-first max-wide:max-w-[560px]">
      <div className="mb-4 flex items-start justify-between gap-3">
        <h2 ref={head} tabIndex={-1} className="text-20 font-medium outline-none">{title}</h2>
        <IconButton icon="cross" label="Close" onClick={() => void navigate(closeTo)} className="-mt-1.5 -mr-2" />
      </div>
      {children}
    </aside>
  )
}
