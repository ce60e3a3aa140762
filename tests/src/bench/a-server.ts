import type { SaveReadings, TestRun } from '../../../shared/api/test-runs.ts'
import type { ReadingStore } from '../../../src/lib/kept-readings/reading-store.ts'
import { nameOf, type Unsent } from '../../../src/lib/kept-readings/unsent.ts'
import { Refusal } from '../../../src/lib/refusal.ts'
import { aReading, aRun } from './a-run.ts'

/** A store as the browser's, that outlives the queues which use it. */
export function aStore(): ReadingStore & { size: () => number } {
  const kept = new Map<string, Unsent>()
  return {
    all: (testRunId) => Promise.resolve([...kept.values()].filter((item) => item.testRunId === testRunId)),
    put: (items) => { for (const item of items) kept.set(nameOf(item), item); return Promise.resolve() },
    remove: (items) => { for (const item of items) kept.delete(nameOf(item)); return Promise.resolve() },
    size: () => kept.size,
  }
}

/** Keeps readings by the rules of the real one: a key once, a version that must be current, a place that must be free. */
export function aServer() {
  let run: TestRun = aRun()
  const server = {
    isAway: false, losesAnswers: false, saves: 0,
    run: () => run,
    refetch: () => (server.isAway ? Promise.reject(new Refusal('unreachable', 'The server cannot be reached.')) : Promise.resolve(run)),
    set: (change: Partial<TestRun>) => { run = { ...run, version: run.version + 1, ...change } },
    send: ({ version, keep, strike }: SaveReadings): Promise<TestRun> => {
      if (server.isAway) return Promise.reject(new Refusal('unreachable', 'The server cannot be reached.'))
      server.saves++
      const fresh = keep.filter(({ key }) => !run.readings.some((reading) => reading.key === key))
      const strikes = strike.filter(({ key }) => !run.readings.find((reading) => reading.key === key)?.struck)
      if (fresh.length > 0 || strikes.length > 0) {
        if (run.state !== 'open') return Promise.reject(new Refusal('not-now', `this run is ${run.state}`))
        if (version !== run.version) return Promise.reject(new Refusal('already-changed', 'This run has changed'))
        const struck = new Set(strikes.map(({ key }) => key))
        const taken = fresh.find(({ path, key }) => [...run.readings, ...fresh].some((other) => other.path === path && other.key !== key && !struck.has(other.key) && !('struck' in other && other.struck)))
        if (taken) return Promise.reject(new Refusal('not-acceptable', 'some readings cannot be kept', { [taken.path]: 'there is a reading already' }))
        const at = '2026-03-10T10:02:00.000Z'
        server.set({ readings: [...run.readings, ...fresh.map((one) => aReading(one))].map((reading) => {
          const reason = strikes.find(({ key }) => key === reading.key)?.reason
          return reason === undefined ? reading : { ...reading, struck: { reason, at, by: 'Edda Vane' } }
        }) })
      }
      if (!server.losesAnswers) return Promise.resolve(run)
      server.losesAnswers = false
      return Promise.reject(new Refusal('unreachable', 'The server cannot be reached.'))
    },
  }
  return server
}
