import { createHash } from 'node:crypto'
import type { Redis } from 'ioredis'
import { RateLimiterMemory, RateLimiterRedis, RateLimiterRes } from 'rate-limiter-flexible'
import { delayAfter } from './delay-after.ts'
import { TooMany } from './too-many.ts'

/** How often, in how many seconds. `requests` and `person` hold one address or person back before the others feel it. */
const allowances = {
  requests: { points: 6000, duration: 60 },
  person: { points: 2400, duration: 60 },
  /** Guessing a report's code or a link's token: far below what could ever hit one. */
  codes: { points: 30, duration: 60 },
  resetsOfAccount: { points: 3, duration: 3600 },
  resetsOfAddress: { points: 20, duration: 3600 },
} as const

export type Allowance = keyof typeof allowances

/** Failed tries that cost nothing yet, and the longest wait after more; an address may be a whole company's. */
const tries = { account: { free: 5, longest: 300 }, address: { free: 20, longest: 900 } } as const

const memorySeconds = 3600

export type Limits = ReturnType<typeof createLimits>

/** Counts in Redis, so that several processes count together; while Redis is away each counts for itself. */
export function createLimits(redis: Redis, prefix: string) {
  const limiter = (name: string, { points, duration }: { points: number; duration: number }) => new RateLimiterRedis({
    storeClient: redis, keyPrefix: `${prefix}:limit:${name}`, points, duration, rejectIfRedisNotReady: true,
    insuranceLimiter: new RateLimiterMemory({ keyPrefix: name, points, duration }),
  })
  const counted = {
    requests: limiter('requests', allowances.requests), person: limiter('person', allowances.person), codes: limiter('codes', allowances.codes),
    resetsOfAccount: limiter('resets-of-account', allowances.resetsOfAccount), resetsOfAddress: limiter('resets-of-address', allowances.resetsOfAddress),
  } satisfies Record<Allowance, RateLimiterRedis>
  const failures = { account: limiter('failures-account', { points: 1_000_000, duration: memorySeconds }), address: limiter('failures-address', { points: 1_000_000, duration: memorySeconds }) }
  const gates = { account: limiter('gate-account', { points: 1, duration: 1 }), address: limiter('gate-address', { points: 1, duration: 1 }) }

  /** Counts a try as failed until it is known to be good, and lets one through per delay: tries at the same time cannot slip past. */
  async function pass(whose: keyof typeof tries, key: string): Promise<void> {
    const { consumedPoints } = await failures[whose].penalty(key)
    const seconds = delayAfter(consumedPoints, tries[whose])
    if (seconds === 0) return
    try {
      await consume(gates[whose], key, { customDuration: seconds })
    } catch (error) {
      await failures[whose].reward(key)
      throw error
    }
  }

  return {
    /** Counts one use of an allowance; refuses with `too-many` when it is used up. */
    async spend(allowance: Allowance, key: string): Promise<void> {
      await consume(counted[allowance], key)
    },

    /**
     * Before a password is checked: refuses while the account or the address has to wait. The wait grows with every failed
     * try and ends by itself; no account is ever locked. Call `succeeded` when the password was right.
     */
    async tryPassword(account: string, address: string): Promise<{ succeeded(): Promise<void> }> {
      const key = createHash('sha256').update(account).digest('hex')
      await pass('address', address)
      try {
        await pass('account', key)
      } catch (error) {
        await failures.address.reward(address)
        throw error
      }
      return {
        async succeeded() {
          await Promise.all([failures.account.delete(key), gates.account.delete(key), failures.address.reward(address), gates.address.delete(address)])
        },
      }
    },
  }
}

async function consume(limiter: RateLimiterRedis, key: string, options: { customDuration?: number } = {}): Promise<void> {
  try {
    await limiter.consume(key, 1, options)
  } catch (refusal) {
    if (refusal instanceof RateLimiterRes) throw new TooMany(refusal.msBeforeNext)
    throw refusal
  }
}
