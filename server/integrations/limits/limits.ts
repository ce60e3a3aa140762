import { Redis } from 'ioredis'
import { outside } from '../outside.ts'
import { createLimits, type Limits } from './create-limits.ts'

let current: { limits: Limits; redis: Redis } | null = null

/** The limits of this process; connects to Redis at the first use and never waits for it. */
export function limits(): Limits {
  return open().limits
}

/** Comes back when Redis answers, or after the given time. */
export async function limitsReady(milliseconds = 2000): Promise<void> {
  const { redis } = open()
  const until = Date.now() + milliseconds
  while (redis.status !== 'ready' && Date.now() < until) await new Promise((resolve) => setTimeout(resolve, 10))
}

export function closeLimits(): void {
  current?.redis.disconnect()
  current = null
}

function open(): { limits: Limits; redis: Redis } {
  if (current) return current
  const redis = new Redis(outside().settings.REDIS_URL, {
    enableOfflineQueue: false, maxRetriesPerRequest: 1, connectTimeout: 2000, commandTimeout: 1000, retryStrategy: (times) => Math.min(2000, 100 * times),
  })
  // Away is not a fault of a request: the limiters count in memory until it is back.
  redis.on('error', () => {})
  current = { redis, limits: createLimits(redis, process.env.QUEUE_PREFIX ?? 'crosshead') }
  return current
}
