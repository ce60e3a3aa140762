import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { attachFile, removeFile } from '../../shared/api/files.ts'
import * as api from '../../shared/api/jobs.ts'
import type { Order } from '../../shared/api/orders.ts'
import { call, sendFile } from '../lib/call.ts'
import { useChange } from '../lib/use-change.ts'

export type JobFilter = Omit<z.input<typeof api.listJobs.query>, 'after' | 'limit'>

export const jobsQuery = (filter: JobFilter) => infiniteQueryOptions({
  queryKey: ['Job', 'list', filter], queryFn: ({ pageParam, signal }) => call(api.listJobs, { query: { ...filter, after: pageParam }, signal }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const jobCountsQuery = queryOptions({ queryKey: ['Job', 'list', 'counts'], queryFn: () => call(api.countJobs, {}) })
export const jobQuery = (jobId: string) => queryOptions({ queryKey: ['Job', 'one', jobId], queryFn: () => call(api.readJob, { params: { jobId } }) })
export const labelsQuery = (jobId: string) => queryOptions({ queryKey: ['Job', 'one', jobId, 'labels'], queryFn: () => call(api.readLabels, { params: { jobId } }) })

/** Asks price and promise for an order as it is typed; nothing is saved. */
export const quoteQuery = (order: Order) => queryOptions({ queryKey: ['Quote', 'one', order], queryFn: ({ signal }) => call(api.quoteOrder, { body: { order }, signal }), placeholderData: (before) => before })

const useJobMutation = <I>(send: (input: I) => Promise<api.Job>) => useChange(send, (id) => jobQuery(id).queryKey, [['Job', 'list']])

export const useDraftJob = () => useJobMutation((body: { from?: string }) => call(api.draftJob, { body }))
export const useSaveDraft = (jobId: string) => useJobMutation((body: { version: number; order: Order }) => call(api.saveDraft, { params: { jobId }, body }))
export const useReopenDraft = (jobId: string) => useJobMutation((body: { version: number }) => call(api.reopenDraft, { params: { jobId }, body }))
export const useCheckPayment = (jobId: string) => useJobMutation(() => call(api.checkPayment, { params: { jobId } }))
export const useCancelJob = (jobId: string) => useJobMutation((body: { version: number; reason: string }) => call(api.cancelJob, { params: { jobId }, body }))
export const useWriteMessage = (jobId: string) => useJobMutation((body: { text: string }) => call(api.writeMessage, { params: { jobId }, body }))
export const useAnswerHold = () => useJobMutation(({ holdId, ...body }: { holdId: string; version: number; answer: string }) => call(api.answerHold, { params: { holdId }, body }))
export const useReleaseHold = () => useJobMutation(({ holdId, ...body }: { holdId: string; version: number; remark: string }) => call(api.releaseHold, { params: { holdId }, body }))
export const useIssueReport = (jobId: string) => useJobMutation((body: { version: number; password: string }) => call(api.issueReport, { params: { jobId }, body }))
export const usePayJob = (jobId: string) => useMutation({ mutationFn: (body: { version: number }) => call(api.payJob, { params: { jobId }, body }) })

export function useDiscardDraft(jobId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (query: { version: number }) => call(api.discardDraft, { params: { jobId }, query }),
    onSuccess: () => { client.removeQueries({ queryKey: ['Job', 'one', jobId] }); void client.invalidateQueries({ queryKey: ['Job', 'list'] }) },
  })
}

export function useAttachFile(jobId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ file, onProgress }: { file: File; onProgress: (share: number) => void }) => sendFile(attachFile, { jobId }, file, onProgress),
    onSuccess: () => client.invalidateQueries({ queryKey: ['Job', 'one', jobId] }),
  })
}
export function useRemoveFile(jobId: string) {
  const client = useQueryClient()
  return useMutation({ mutationFn: (fileId: string) => call(removeFile, { params: { fileId } }), onSuccess: () => client.invalidateQueries({ queryKey: ['Job', 'one', jobId] }) })
}
