import { queryOptions, useMutation } from '@tanstack/react-query'
import type * as z from 'zod'
import { addRecord } from '../../shared/api/files.ts'
import * as api from '../../shared/api/test-runs.ts'
import { call, sendFile } from '../lib/call.ts'
import { useChange } from '../lib/use-change.ts'

export const runQuery = (testRunId: string) => queryOptions({ queryKey: ['TestRun', 'one', testRunId], queryFn: () => call(api.readRun, { params: { testRunId } }) })
export const reviewsQuery = queryOptions({ queryKey: ['TestRun', 'list', 'reviews'], queryFn: () => call(api.listReviews, {}) })

const useRunMutation = <I>(send: (input: I) => Promise<api.TestRun>) => useChange(send, (id) => runQuery(id).queryKey, [['TestRun', 'list'], ['PlanEntry', 'list']])

export const useStartRun = () => useRunMutation(({ testId, benchId }: { testId: string; benchId: string }) => call(api.startRun, { params: { testId }, body: { benchId } }))
export const useRecordRun = (testRunId: string) => useRunMutation((body: { version: number; remark: string }) => call(api.recordRun, { params: { testRunId }, body }))
export const useStopRun = (testRunId: string) => useRunMutation((body: { version: number; reason: string }) => call(api.stopRun, { params: { testRunId }, body }))
export const useReviewRun = (testRunId: string) => useRunMutation((body: z.input<typeof api.reviewRun.body>) => call(api.reviewRun, { params: { testRunId }, body }))

/** Sends kept readings; for the sheet's own queue, which repeats it until the server has them. */
export const sendReadings = (testRunId: string, body: z.input<typeof api.SaveReadings>) => call(api.saveReadings, { params: { testRunId }, body })

export const useAddRecord = (testRunId: string) => useMutation({
  mutationFn: ({ file, onProgress }: { file: File; onProgress: (share: number) => void }) => sendFile(addRecord, { testRunId }, file, onProgress),
})
