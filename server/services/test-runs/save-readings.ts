import type { SaveReadings, TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import { methodOf } from '../../../shared/methods.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { Reading } from '../../models/runs/reading.ts'
import { Strike } from '../../models/runs/strike.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { readingsOf, type KeptReading } from './live-readings.ts'
import { runView } from './run-view.ts'

/**
 * Keeps readings and strikes some out. What was sent before, known by its key, is left as it is: a repeated save is no
 * change. A save on an older version of the run is refused, so that two screens cannot overwrite each other unseen.
 */
export async function saveReadings(testRunId: string, save: SaveReadings, caller: Caller): Promise<TestRunView> {
  await inTransaction(caller, async (tx) => {
    const run = await loadOne(TestRun, 'TestRun', testRunId, caller, { tx, lock: true })
    must(caller, 'record', 'TestRun', run)
    const kept = await readingsOf(run.id, tx)
    const byKey = new Map(kept.map((one) => [one.reading.key, one]))
    const fresh = save.keep.filter(({ key }) => !byKey.has(key))
    const strikes = save.strike.filter(({ key }) => !byKey.get(key)?.strike)
    if (fresh.length === 0 && strikes.length === 0) return
    if (run.state !== 'open') throw new Problem('not-now', `this run is ${run.state}; its readings stay as they are`)
    if (run.performedById !== caller.person.id) throw new Problem('not-allowed', 'someone else carries out this run')
    mustBeCurrent(run, save.version, 'This run')
    const faults = faultsOf(run.methodId, fresh, strikes, kept)
    if (Object.keys(faults).length > 0) throw new Problem('not-acceptable', 'some readings cannot be kept', faults)

    const rows = await Reading.bulkCreate(fresh.map(({ key, path, value }) => ({ testRunId: run.id, key, path, value, byId: caller.person.id })), { transaction: tx })
    const idOf = new Map([...kept.map(({ reading }): [string, string] => [reading.key, reading.id]), ...rows.map((row): [string, string] => [row.get('key'), row.get('id')])])
    await Strike.bulkCreate(strikes.map(({ key, reason }) => ({ readingId: idOf.get(key)!, testRunId: run.id, reason, byId: caller.person.id })), { transaction: tx })
    await TestRun.update({ version: run.version + 1 }, { where: { id: run.id }, transaction: tx })
    tx.record({ type: 'test-run.readings-saved', id: run.id, jobId: run.jobId, siteId: run.siteId, data: { kept: fresh.length, struck: strikes.length } })
  })
  return runView(await loadOne(TestRun, 'TestRun', testRunId, caller), caller)
}

/** What is wrong with each new reading or strike, by its place in the request. */
function faultsOf(methodId: string, fresh: SaveReadings['keep'], strikes: SaveReadings['strike'], kept: readonly KeptReading[]): Record<string, string> {
  const method = methodOf(methodId)!
  const faults: Record<string, string> = {}
  const known = new Set([...kept.map(({ reading }) => reading.key), ...fresh.map(({ key }) => key)])
  const struck = new Set(strikes.map(({ key }) => key))
  for (const key of twice(fresh)) faults[`keep.${key}`] = 'stands twice in one save'
  for (const key of twice(strikes)) faults[`strike.${key}`] = 'stands twice in one save'
  const taken = new Set(kept.filter(({ reading, strike }) => !strike && !struck.has(reading.key)).map(({ reading }) => reading.path))
  for (const { key } of strikes) if (!known.has(key)) faults[`strike.${key}`] = 'there is no such reading in this run'
  for (const { key, path, value } of fresh) {
    const wrong = checkEntry(method, path, value)
    if (wrong) faults[path] = wrong
    else if (taken.has(path) && !path.startsWith('parameters.')) faults[path] = 'there is a reading already; strike it out with a reason first'
    if (!struck.has(key)) taken.add(path)
  }
  return faults
}

/** Keys that one list names more than once. */
function twice(list: readonly { key: string }[]): string[] {
  const seen = new Set<string>()
  return list.flatMap(({ key }) => (seen.size === seen.add(key).size ? [key] : []))
}
