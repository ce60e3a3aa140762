import { queryOptions, useMutation, useQueryClient, useSuspenseQuery } from '@tanstack/react-query'
import { abilityFor } from '../../shared/access/abilities.ts'
import * as api from '../../shared/api/sessions.ts'
import { call } from '../lib/call.ts'

export const sessionQuery = queryOptions({ queryKey: ['Session', 'one'], queryFn: () => call(api.readSession, {}), staleTime: 5 * 60_000 })

/** Who is signed in; only under the signed-in frame, which makes sure that somebody is. */
export function useMe(): api.Me {
  const { data } = useSuspenseQuery(sessionQuery)
  if (!data.me) throw new Error('nobody is signed in')
  return data.me
}

/** What I may do, for buttons: `useMay()('issue', 'Report')`. */
export function useMay() {
  const me = useMe()
  const ability = abilityFor(me)
  return (...asked: Parameters<typeof ability.can>) => ability.can(...asked)
}

function useSessionMutation<I>(mutationFn: (input: I) => Promise<api.Session>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn,
    onSuccess: (session) => {
      client.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'Session' })
      client.setQueryData(sessionQuery.queryKey, session)
    },
  })
}

export const useSignIn = () => useSessionMutation((body: { email: string; password: string; sharedScreen: boolean }) => call(api.signIn, { body }))
export const useSignOut = () => useSessionMutation(() => call(api.signOut, {}))
export const useChangePassword = () => useSessionMutation((body: { current: string; next: string }) => call(api.changePassword, { body }))
export const useAskPasswordReset = () => useMutation({ mutationFn: (body: { email: string }) => call(api.askPasswordReset, { body }) })
export const linkQuery = (token: string) => queryOptions({ queryKey: ['Link', 'one', token], queryFn: () => call(api.readLink, { params: { token } }), retry: false })
export const useLinkPassword = (token: string) => useSessionMutation((body: { password: string }) => call(api.useLink, { params: { token }, body }))
