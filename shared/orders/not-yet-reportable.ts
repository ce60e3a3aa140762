import type { JobState, TestState } from '../api/words.ts'

/** Why a job's report cannot be issued yet, in one sentence; empty when it can. */
export function notYetReportable({ state, holds, tests }: { state: JobState; holds: number; tests: readonly { state: TestState }[] }): string {
  if (state === 'draft') return 'the job has not been placed'
  if (state === 'cancelled') return 'the job was cancelled'
  if (holds > 0) return holds === 1 ? 'a hold is still open' : `${holds} holds are still open`
  const live = tests.filter((test) => test.state !== 'void')
  if (live.length === 0) return 'no test of this job is left to report'
  const open = live.filter((test) => test.state !== 'accepted' && test.state !== 'reported').length
  if (open > 0) return `${open} of ${live.length} ${live.length === 1 ? 'test is' : 'tests are'} not accepted yet`
  return ''
}
