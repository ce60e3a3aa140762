import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { TestRun } from '../../models/runs/test-run.ts'

/** The caller's own open run at the version they saw, locked; refuses anyone else's, and one that is no longer open. */
export async function loadOwnRun(testRunId: string, seen: number, caller: Caller, tx: Tx): Promise<TestRun> {
  const run = await loadOne(TestRun, 'TestRun', testRunId, caller, { tx, lock: true })
  must(caller, 'record', 'TestRun', run)
  if (run.performedById !== caller.person.id) throw new Problem('not-allowed', 'someone else carries out this run')
  if (run.state !== 'open') throw new Problem('not-now', `this run is ${run.state} already`)
  mustBeCurrent(run, seen, 'This run')
  return run
}
