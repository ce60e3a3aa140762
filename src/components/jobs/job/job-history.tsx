import { useInfiniteQuery } from '@tanstack/react-query'
import { jobEventsQuery } from '../../../api/people.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { QueryState } from '../../ui/query-state.tsx'
import { SideSection } from '../../ui/side-section.tsx'
import { When } from '../../ui/when.tsx'

/** The ledger of a job, newest first: what happened, by whom, when. */
export function JobHistory({ jobId, zone }: { jobId: string; zone: string }) {
  const events = useInfiniteQuery(jobEventsQuery(jobId))
  return (
    <SideSection title="What has happened">
      <QueryState query={events} what="the ledger of this job" empty={{ when: ({ pages }) => pages[0]?.items.length === 0, title: 'Nothing yet' }}>
        {({ pages }) => (
          <>
            <ol className="text-13">
              {pages.flatMap(({ items }) => items).map(({ id, type, at, by, text }) => (
                <li key={id} className="border-b border-line py-2">
                  <span className="flex justify-between gap-3"><b>{eventWords(type)}</b><When at={at} show="both" day="short" zone={zone} className="text-quiet" /></span>
                  <span className="block text-quiet">{[by ?? 'by itself', text].filter(Boolean).join(': ')}</span>
                </li>
              ))}
            </ol>
            {events.hasNextPage && <Button kind="bare" size="tiny" className="mt-2 -ml-2" busy={events.isFetchingNextPage} onClick={() => void events.fetchNextPage()}>Show more</Button>}
          </>
        )}
      </QueryState>
    </SideSection>
  )
}

/** "test-run.readings-saved" as people read it: "Test run: readings saved". */
function eventWords(type: string): string {
  const [subject = '', happened = ''] = type.split('.')
  const words = `${subject.replaceAll('-', ' ')}: ${happened.replaceAll('-', ' ')}`
  return words.charAt(0).toUpperCase() + words.slice(1)
}
