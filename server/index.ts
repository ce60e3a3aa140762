import { createServer } from 'node:http'
import { Redis } from 'ioredis'
import { createApp } from './app.ts'
import { announceWith } from './database/announce.ts'
import { database } from './database/connection.ts'
import { log } from './http/log.ts'
import { changesChannel } from './integrations/changes-channel.ts'
import { createIntegrations } from './integrations/create-integrations.ts'
import { closeLimits } from './integrations/limits/limits.ts'
import { setOutside } from './integrations/outside.ts'
import { readSettings } from './integrations/settings.ts'

/** Requests under way get this long to finish when the process is told to stop. */
const patienceMs = 8000

const settings = readSettings()
const integrations = createIntegrations(settings)
setOutside({ ...integrations, settings })

const redis = new Redis(settings.REDIS_URL, { maxRetriesPerRequest: 1, enableOfflineQueue: false, retryStrategy: (times) => Math.min(times * 100, 2000) })
redis.on('error', (error) => log.warn({ error: error.message }, 'redis'))
const channel = changesChannel(process.env.QUEUE_PREFIX ?? 'crosshead')
announceWith((ledgerId) => void redis.publish(channel, String(ledgerId)).catch(() => undefined))

const app = createApp()
const server = createServer({ headersTimeout: 20_000, requestTimeout: 300_000, keepAliveTimeout: 65_000 }, app)
server.listen(settings.PORT, settings.HOST, () => log.info({ port: settings.PORT }, 'listening'))
server.on('error', (error) => {
  log.fatal({ error: error.message }, 'cannot listen')
  process.exit(1)
})

let stopping = false
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.on(signal, () => {
    if (stopping) return
    stopping = true
    void stop()
  })
}

/** Takes no new requests, ends the streams, lets the others finish, then lets go of everything. */
async function stop(): Promise<void> {
  const ended = new Promise<void>((resolve) => server.close(() => resolve()))
  const forced = setTimeout(() => server.closeAllConnections(), patienceMs)
  app.endStreams()
  server.closeIdleConnections()
  await ended
  clearTimeout(forced)
  await app.close()
  closeLimits()
  redis.disconnect()
  integrations.mail.close()
  await database.close()
  log.info('stopped')
  process.exit(0)
}
