import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { listEvents } from '../../shared/api/changes.ts'
import { downloadFile } from '../../shared/api/files.ts'
import * as api from '../../shared/api/people.ts'
import { addressOf, call } from '../lib/call.ts'

export type PeopleFilter = Omit<z.input<typeof api.listPeople.query>, 'after' | 'limit'>
export const peopleQuery = (filter: PeopleFilter) => infiniteQueryOptions({
  queryKey: ['Person', 'list', filter], queryFn: ({ pageParam }) => call(api.listPeople, { query: { ...filter, after: pageParam } }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const customersQuery = queryOptions({ queryKey: ['Customer', 'list'], queryFn: () => call(api.listCustomers, {}) })

function usePersonMutation<I>(mutationFn: (input: I) => Promise<api.Person>) {
  const client = useQueryClient()
  return useMutation({ mutationFn, onSuccess: () => client.invalidateQueries({ queryKey: ['Person', 'list'] }) })
}
export const useInvitePerson = () => usePersonMutation((body: z.input<typeof api.InvitePerson>) => call(api.invitePerson, { body }))
export const useDisablePerson = () => usePersonMutation(({ personId, version }: { personId: string; version: number }) => call(api.disablePerson, { params: { personId }, body: { version } }))
export const useGrantAuthorisation = () => usePersonMutation(({ personId, ...body }: { personId: string } & z.input<typeof api.grantAuthorisation.body>) => call(api.grantAuthorisation, { params: { personId }, body }))

export const jobEventsQuery = (jobId: string) => infiniteQueryOptions({
  queryKey: ['Event', 'list', jobId], queryFn: ({ pageParam }) => call(listEvents, { params: { jobId }, query: { after: pageParam } }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const fileAddress = (fileId: string) => addressOf(downloadFile, { fileId })
/** A picture's copy for display. */
export const filePicture = (fileId: string) => addressOf(downloadFile, { fileId }, { as: 'display' })
