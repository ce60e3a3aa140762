import { Redis } from 'ioredis'
import { pino } from 'pino'
import { announceWith } from '../server/database/announce.ts'
import { database } from '../server/database/connection.ts'
import { changesChannel } from '../server/integrations/changes-channel.ts'
import { createIntegrations } from '../server/integrations/create-integrations.ts'
import { setOutside } from '../server/integrations/outside.ts'
import { readSettings } from '../server/integrations/settings.ts'
import { startWorker } from './start-worker.ts'
import { sweeps } from './sweeps.ts'
import { tasks } from './tasks.ts'

const log = pino({ level: process.env.LOG_LEVEL ?? 'info', base: null, timestamp: pino.stdTimeFunctions.isoTime })
const settings = readSettings()
const integrations = createIntegrations(settings)
setOutside({ ...integrations, settings })

const prefix = process.env.QUEUE_PREFIX ?? 'crosshead'
const redis = new Redis(settings.REDIS_URL, { maxRetriesPerRequest: 1, enableOfflineQueue: false, retryStrategy: (times) => Math.min(times * 100, 2000) })
redis.on('error', (error) => log.warn({ error: error.message }, 'redis'))
announceWith((ledgerId) => void redis.publish(changesChannel(prefix), String(ledgerId)).catch(() => undefined))

const milliseconds = (name: string) => (process.env[name] ? Number(process.env[name]) : undefined)
const asked = { lockMs: milliseconds('WORKER_LOCK_MS'), sweepMs: milliseconds('WORKER_SWEEP_MS'), againSeconds: milliseconds('WORKER_AGAIN_SECONDS') }
const running = startWorker({ redisUrl: settings.REDIS_URL, prefix, tasks, sweeps, log, pace: Object.fromEntries(Object.entries(asked).filter(([, value]) => value !== undefined)) })
log.info('the worker is running')

let stopping = false
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.on(signal, () => {
    if (stopping) return
    stopping = true
    void running.stop().then(async () => {
      integrations.mail.close()
      redis.disconnect()
      await database.close()
      process.exit(0)
    })
  })
}
