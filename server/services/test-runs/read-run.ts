import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import type { Caller } from '../../caller.ts'
import { loadOne } from '../../models/load.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { runView } from './run-view.ts'

/** One run, for whoever works at its site. */
export async function readRun(testRunId: string, caller: Caller): Promise<TestRunView> {
  return runView(await loadOne(TestRun, 'TestRun', testRunId, caller), caller)
}
