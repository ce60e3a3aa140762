import { Redis } from 'ioredis'
import RedisMock from 'ioredis-mock'
import { afterAll, beforeEach, describe, expect, it } from 'vitest'
import { createLimits } from '../../../server/integrations/limits/create-limits.ts'
import { delayAfter } from '../../../server/integrations/limits/delay-after.ts'
import { TooMany } from '../../../server/integrations/limits/too-many.ts'

const mock = new RedisMock()
const nobody = new Redis({ host: '127.0.0.1', port: 9, lazyConnect: true, enableOfflineQueue: false, retryStrategy: () => null })
nobody.on('error', () => undefined)
afterAll(() => { mock.disconnect(); nobody.disconnect() })
beforeEach(() => mock.flushall())

const failure = async (work: Promise<unknown>): Promise<unknown> => work.then(() => null, (error: unknown) => error)

describe('the wait after failed tries', () => {
  it('is nothing for the free ones, then doubles up to its longest', () => {
    const rule = { free: 5, longest: 300 }
    expect([0, 5, 6, 7, 8, 9, 14, 15, 1_000_000].map((failed) => delayAfter(failed, rule))).toEqual([0, 0, 1, 2, 4, 8, 256, 300, 300])
  })
})

describe.each([['with Redis', mock], ['without Redis', nobody]])('limits %s', (name, redis) => {
  const limits = createLimits(redis, name)

  it('let an allowance be spent and no more, each key for itself', async () => {
    for (let n = 0; n < 30; n += 1) await limits.spend('codes', '203.0.113.7')
    const refused = await failure(limits.spend('codes', '203.0.113.7'))
    expect(refused).toBeInstanceOf(TooMany)
    expect(refused).toMatchObject({ code: 'too-many' })
    expect((refused as TooMany).seconds).toBeGreaterThan(50)
    await limits.spend('codes', '203.0.113.8')
  })

  it('let five wrong passwords pass freely, then one per wait', async () => {
    for (let n = 0; n < 5; n += 1) await limits.tryPassword('one@people.example', `203.0.113.${n}`)
    const more = await Promise.all([20, 21, 22].map((n) => failure(limits.tryPassword('one@people.example', `203.0.113.${n}`))))
    expect(more.filter((error) => error === null)).toHaveLength(1)
    expect(more.filter((error) => error instanceof TooMany)).toHaveLength(2)
    await limits.tryPassword('other@people.example', '203.0.113.21')
  })

  it('do not let tries at the same time slip past', async () => {
    const tries = await Promise.all(Array.from({ length: 40 }, (_, n) => failure(limits.tryPassword('two@people.example', `198.51.100.${n}`))))
    // Five are free and one passes; a machine so slow that waits of 1 and 2 s end meanwhile lets two more through.
    const passed = tries.filter((error) => error === null).length
    expect(passed).toBeGreaterThanOrEqual(6)
    expect(passed).toBeLessThanOrEqual(8)
  })

  it('forget an account\'s failures when the password was right', async () => {
    for (let round = 0; round < 3; round += 1) {
      for (let n = 0; n < 4; n += 1) await limits.tryPassword('three@people.example', `192.0.2.${round * 10 + n}`)
      const attempt = await limits.tryPassword('three@people.example', '192.0.2.100')
      await attempt.succeeded()
    }
  })
})
