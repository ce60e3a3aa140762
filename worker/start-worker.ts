import { Queue, Worker } from 'bullmq'
import { Redis } from 'ioredis'
import type { Logger } from 'pino'
import { carryOut, giveUp } from './carry-out.ts'
import { handAgain, relayOnce, type Handed } from './relay.ts'
import type { Task } from './task.ts'

/** `lockMs`: how long a dead worker's piece of work waits before another takes it up; a living worker renews its lock. */
export type Pace = { relayMs: number; againSeconds: number; sweepMs: number; lockMs: number }
const usual: Pace = { relayMs: 300, againSeconds: 60, sweepMs: 30_000, lockMs: 20_000 }

export type Running = { stop(): Promise<void> }

/**
 * Starts relay, queue and sweeps. Everything may run in several processes at once. `sweeps` are chores without an event,
 * such as asking after payments that nobody told us about; they too must be safe to do twice.
 */
export function startWorker(options: { redisUrl: string; prefix: string; tasks: readonly Task[]; sweeps: readonly (() => Promise<unknown>)[]; log: Logger; pace?: Partial<Pace>; concurrency?: number }): Running {
  const { redisUrl, prefix, tasks, sweeps, log } = options
  const pace = { ...usual, ...options.pace }
  const connection = () => new Redis(redisUrl, { maxRetriesPerRequest: null, enableOfflineQueue: true, retryStrategy: (times) => Math.min(times * 100, 2000) })
  const connections = [connection(), connection()]
  for (const one of connections) one.on('error', (error) => log.warn({ error: error.message }, 'redis'))
  const queue = new Queue<Handed>('tasks', { connection: connections[0]!, prefix })
  const worker = new Worker<Handed>('tasks', (job) => carryOut(job.data, tasks), { connection: connections[1]!, prefix, concurrency: options.concurrency ?? 4, stalledInterval: pace.lockMs / 4, lockDuration: pace.lockMs, maxStalledCount: 20 })
  queue.on('error', (error) => log.warn({ error: error.message }, 'queue'))
  worker.on('error', (error) => log.warn({ error: error.message }, 'worker'))
  worker.on('failed', (job, error) => {
    log.error({ task: job?.name, eventId: job?.data.eventId, attempt: job?.attemptsMade, error: error.stack }, 'task failed')
    if (job && job.attemptsMade >= (job.opts.attempts ?? 1)) void giveUp(job.data, error).catch((cause: unknown) => log.error({ error: String(cause) }, 'could not note a failed task'))
  })

  const loops = [
    every(pace.relayMs, async () => { while ((await relayOnce(queue, tasks)) > 0); }, log, 'relay'),
    every(pace.againSeconds * 500, () => handAgain(queue, tasks, pace.againSeconds), log, 'hand again'),
    ...sweeps.map((sweep) => every(pace.sweepMs, sweep, log, 'sweep')),
  ]
  return {
    async stop() {
      await Promise.all(loops.map((loop) => loop.stop()))
      await worker.close()
      await queue.close()
      for (const one of connections) one.disconnect()
    },
  }
}

/** Repeats a chore, one at a time, with a pause between; a failure is logged and the next time comes all the same. */
function every(ms: number, chore: () => Promise<unknown>, log: Logger, what: string): Running {
  let stopped = false
  let timer: NodeJS.Timeout | undefined
  let wake: (() => void) | undefined
  const turn = async () => {
    while (!stopped) {
      try {
        await chore()
      } catch (error) {
        log.warn({ error: error instanceof Error ? error.message : String(error) }, `${what} failed, will try again`)
      }
      if (stopped) return
      await new Promise<void>((resolve) => { wake = resolve; timer = setTimeout(resolve, ms) })
    }
  }
  const ended = turn()
  return { async stop() { stopped = true; clearTimeout(timer); wake?.(); await ended } }
}
