import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query'
import type * as z from 'zod'
import { addPhoto } from '../../shared/api/files.ts'
import * as api from '../../shared/api/samples.ts'
import { call, sendFile } from '../lib/call.ts'
import { useChange } from '../lib/use-change.ts'

export type SampleFilter = Omit<z.input<typeof api.listSamples.query>, 'after' | 'limit'>

export const samplesQuery = (filter: SampleFilter) => infiniteQueryOptions({
  queryKey: ['Sample', 'list', filter], queryFn: ({ pageParam, signal }) => call(api.listSamples, { query: { ...filter, after: pageParam }, signal }),
  initialPageParam: undefined as string | undefined, getNextPageParam: ({ next }) => next ?? undefined,
})
export const sampleQuery = (sampleId: string) => queryOptions({ queryKey: ['Sample', 'one', sampleId], queryFn: () => call(api.readSample, { params: { sampleId } }) })

/** What a scanned code stands for. */
export const useFindCode = () => useMutation({ mutationFn: (code: string) => call(api.findCode, { params: { code } }) })

const useSampleMutation = <I>(send: (input: I) => Promise<api.Sample>) => useChange(send, (id) => sampleQuery(id).queryKey, [['Sample', 'list'], ['PlanEntry', 'list']])

export const useReceiveSample = (sampleId: string) => useSampleMutation((body: z.input<typeof api.receiveSample.body>) => call(api.receiveSample, { params: { sampleId }, body }))
export const useReportMissing = (sampleId: string) => useSampleMutation((body: { version: number; remark: string }) => call(api.reportMissing, { params: { sampleId }, body }))
export const useStartStep = () => useSampleMutation(({ stepId, benchId }: { stepId: string; benchId: string }) => call(api.startStep, { params: { stepId }, body: { benchId } }))
export const useFinishStep = () => useSampleMutation(({ stepId, remark }: { stepId: string; remark: string }) => call(api.finishStep, { params: { stepId }, body: { remark } }))

export function useAddPhoto(sampleId: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: ({ file, onProgress }: { file: File; onProgress: (share: number) => void }) => sendFile(addPhoto, { sampleId }, file, onProgress),
    onSuccess: () => client.invalidateQueries({ queryKey: ['Sample', 'one', sampleId] }),
  })
}
