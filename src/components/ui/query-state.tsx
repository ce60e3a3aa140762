import type { ReactNode } from 'react'
import { Button } from './buttons/button.tsx'
import { MessageCard } from './feedback/message-card.tsx'
import { Note } from './feedback/note.tsx'

/** What is needed of a TanStack Query result. */
export type QueryLike<Data> = { data: Data | undefined; error: unknown; isPending: boolean; isFetching: boolean; refetch: () => unknown }

export type QueryStateProps<Data> = {
  query: QueryLike<Data>
  /** What is being fetched, as in "Loading the jobs": "the jobs". */
  what: string
  /** When there is nothing to show, and what to do first then. */
  empty?: { when: (data: Data) => boolean; title: string; text?: ReactNode; action?: ReactNode }
  /** What stands in place while it loads; grey lines unless given. */
  loading?: ReactNode
  /** Whose it is and whom to ask, when it is refused. */
  refused?: ReactNode
  children: (data: Data) => ReactNode
}

/**
 * Draws a query in each of its states: loading, refused, not found, failed, empty, there. What is there stays while it is fetched
 * again, also when that fails. `<QueryState query={jobs} what="the jobs" empty={…}>{(jobs) => …}</QueryState>`
 */
export function QueryState<Data>({ query, what, empty, loading, refused, children }: QueryStateProps<Data>) {
  const again = <Button size="tiny" busy={query.isFetching} onClick={() => void query.refetch()}>Try again</Button>
  if (query.data === undefined) {
    if (!query.error) return loading ?? <Loading what={what} />
    const problem = readProblem(query.error)
    if (problem.code === 'not-found') {
      return <MessageCard role="alert" icon="stop" title={`${capital(what)}: not found`}>{refused ?? 'It is not there, or not yours to open. Check the number, or ask who sent you the link.'}</MessageCard>
    }
    if (problem.code === 'not-allowed') {
      return <MessageCard role="alert" icon="stop" title="Not yours to open">{refused ?? problem.message}</MessageCard>
    }
    return (
      <MessageCard role="alert" icon="warning" title={`${capital(what)} did not load`} action={again}>
        {problem.message} Nothing is lost. {problem.requestId && <span className="text-quiet">Request <span className="mono">{problem.requestId}</span></span>}
      </MessageCard>
    )
  }
  if (empty?.when(query.data)) return <MessageCard title={empty.title} action={empty.action}>{empty.text}</MessageCard>
  return (
    <>
      {query.error != null && <Note kind="warn" live className="mb-4" title="Not up to date." actions={again}>{readProblem(query.error).message}</Note>}
      {children(query.data)}
    </>
  )
}

function Loading({ what }: { what: string }) {
  return (
    <div role="status" aria-busy className="grid max-w-[560px] gap-2.5 py-2">
      <p className="text-quiet">Loading {what}</p>
      {['w-4/5', 'w-3/5', 'w-2/3'].map((width) => <i key={width} aria-hidden className={`h-3 rounded bg-line opacity-80 ${width}`} />)}
    </div>
  )
}

/** Code, words and request id of a refusal, as far as it has them. */
function readProblem(error: unknown): { code?: string; message: string; requestId?: string } {
  if (typeof error !== 'object' || error === null) return { message: 'Something went wrong.' }
  const text = (key: string) => {
    const value: unknown = Reflect.get(error, key)
    return typeof value === 'string' && value !== '' ? value : undefined
  }
  return { code: text('code'), message: sentence(text('message') ?? 'Something went wrong.'), requestId: text('requestId') }
}

function sentence(text: string): string {
  return /[.!?]$/.test(text) ? text : `${text}.`
}
function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1)
}
