import { useQueryClient, useSuspenseQuery } from '@tanstack/react-query'
import { Suspense, useCallback, useMemo, useRef, useState } from 'react'
import { Navigate, Outlet, useLocation, useNavigate } from 'react-router-dom'
import { useFindCode } from '../../api/samples.ts'
import { sessionQuery, useSignOut } from '../../api/session.ts'
import { useLive } from '../../lib/live.ts'
import { PageFrame } from '../shell/page-frame.tsx'
import { Strip } from '../shell/strip.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { FrameContext, type TakeCode } from './frame-context.ts'
import { pagesFor } from './pages-for.ts'

/** Pages that set their own margins. */
const bare = /^\/(bench\/|review|floor)/

/** Everything behind the sign-in: the strip, the page under it, and the ear for what changes elsewhere. */
export function SignedInFrame() {
  const { data: { me } } = useSuspenseQuery(sessionQuery)
  const client = useQueryClient()
  const location = useLocation()
  const navigate = useNavigate()
  const signOut = useSignOut()
  const findCode = useFindCode()
  const say = useToast()
  const [hereDetail, setHereDetail] = useState<string>()
  const takeCode = useRef<TakeCode>(undefined)
  const setTakeCode = useCallback((take: TakeCode | undefined) => { takeCode.current = take }, [])
  const frame = useMemo(() => ({ setHereDetail, setTakeCode }), [setTakeCode])
  useLive(client, me !== null)
  if (!me) return <Navigate to="/sign-in" replace state={{ from: location.pathname + location.search }} />

  const pages = pagesFor(me).map((page) => ({ ...page, current: location.pathname.startsWith(page.to) }))
  const open = (code: string) => findCode.mutate(code.trim(), {
    onSuccess: (found) => {
      const { subject, id } = found
      if (!takeCode.current?.(found)) void navigate({ Sample: `/samples/${id}`, Job: `/jobs/${id}`, Report: `/reports?open=${id}` }[subject])
    },
    onError: (error) => say({ text: error.message, kind: 'bad' }),
  })
  return (
    <FrameContext value={frame}>
      <PageFrame
        layout={bare.test(location.pathname) ? 'bare' : 'page'}
        strip={
          <Strip
            here={me.place} hereDetail={hereDetail} pages={pages} me={{ name: me.initials, detail: `${me.name}, ${me.email}`, links: [{ to: '/me', label: 'Me and my password', current: location.pathname === '/me' }] }}
            onSignOut={() => signOut.mutate(undefined, { onSuccess: () => void navigate('/sign-in') })} onScan={open} onSearch={(text) => void navigate(`/samples?search=${encodeURIComponent(text)}`)} scanBusy={findCode.isPending}
          />
        }
      >
        <Suspense fallback={<p role="status" className="p-gutter text-quiet">Loading the page</p>}>
          <Outlet />
        </Suspense>
      </PageFrame>
    </FrameContext>
  )
}
