import { once } from 'node:events'
import { setTimeout as sleep } from 'node:timers/promises'
import { explain } from '../failure.mjs'
import { endProcesses, identify, remainsOf, signal } from './processes.mjs'
import { forget, recall, remember } from '../data/remembered.mjs'
import { say } from '../say.mjs'

const FIRST_DELAY_MS = 500
const LONGEST_DELAY_MS = 30_000
const STEADY_MS = 60_000 // after this long the next death counts as the first again

const noteOf = (name) => `process-${name}`
const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null
const howItEnded = (child) => (child.signalCode ? `killed by ${child.signalCode}` : `exit status ${child.exitCode}`)

/** Ends what a killed launcher left running under these names; a pid that now belongs to something else is left alone. */
export async function endNoted(names) {
  const remains = names.map(noteOf).flatMap((note) => remainsOf(recall(note)))
  await endProcesses(remains, 'SIGTERM', 5000)
  for (const name of names) forget(noteOf(name))
  return remains.length
}

/**
 * Keeps one process running. `launch(onSpawn)` starts it, hands the child to `onSpawn` at once, and comes back when it is of use. When it
 * dies, one line says so and it is launched again, later each time. With a `hint` (a part of its command line) it is noted, so that the next
 * start finds it should we be killed. Returns `ready`, a promise of the first launch, and `stop`.
 */
export function supervise({ name, title, launch, hint, stopSignal = 'SIGTERM', patienceMs = 15_000 }) {
  let child = null
  let noted = null
  const stopping = new AbortController()

  function onSpawn(started) {
    child = started
    if (hint && started.pid) {
      noted = identify(started.pid, hint)
      remember(noteOf(name), noted)
    }
    if (stopping.signal.aborted) signal(started.pid, stopSignal)
  }

  // A watcher that is killed leaves the process it watched.
  const endRemains = () => endProcesses(remainsOf(noted), 'SIGKILL', 0)

  async function keepRunning() {
    let delay = FIRST_DELAY_MS
    let since = Date.now()
    let fault = null
    for (;;) {
      if (child.pid && !hasEnded(child)) await once(child, 'exit')
      if (stopping.signal.aborted) return
      await endRemains()
      if (Date.now() - since > STEADY_MS) delay = FIRST_DELAY_MS
      say(`${fault ?? `${title} ended (${howItEnded(child)})`}; starting it again in ${delay / 1000} s`)
      await sleep(delay, undefined, { signal: stopping.signal }).catch(() => {})
      if (stopping.signal.aborted) return
      delay = Math.min(delay * 2, LONGEST_DELAY_MS)
      since = Date.now()
      try {
        await launch(onSpawn)
        fault = null
        if (!stopping.signal.aborted) say(`${title} runs again`)
      } catch (error) {
        fault = explain(error).split('\n')[0]
      }
    }
  }

  const ready = launch(onSpawn)
  const over = ready.then(keepRunning, () => {})

  return {
    title,
    ready,
    async stop() {
      stopping.abort()
      if (child?.pid && !hasEnded(child)) signal(child.pid, stopSignal)
      const timer = setTimeout(() => child?.pid && signal(child.pid, 'SIGKILL'), patienceMs)
      await over
      if (child?.pid && !hasEnded(child)) await once(child, 'exit')
      clearTimeout(timer)
      await endRemains()
      forget(noteOf(name))
    },
  }
}
