import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/method/method.ts'
import { Requirement } from '../../../shared/method/requirement.ts'
import { verdict } from '../../../shared/method/verdict.ts'

const result = (key: string, value: number, expandedUncertainty?: number): Result => ({
  key, symbol: key, value, unit: '', reported: String(value), basis: '', approximate: false, derivation: [], ...(expandedUncertainty !== undefined && { expandedUncertainty, coverageFactor: 2 }),
})

describe('verdict', () => {
  it('passes only when every limit is met', () => {
    const both = { rule: 'simple' as const, limits: [{ key: 'mean', lower: 58, upper: 62 }, { key: 'range', upper: 2 }] }
    expect(verdict(both, [result('mean', 60), result('range', 2)])).toEqual({
      outcome: 'pass', rule: 'simple', limits: [{ key: 'mean', lower: 58, upper: 62, outcome: 'pass' }, { key: 'range', upper: 2, outcome: 'pass' }],
    })
    expect(verdict(both, [result('mean', 60), result('range', 2.1)]).outcome).toBe('fail')
    expect(verdict(both, [result('mean', 57.999), result('range', 1)]).limits.map((limit) => limit.outcome)).toEqual(['fail', 'pass'])
  })
  it('is undecided about a result that is not there, and fails all the same when another fails', () => {
    const both = { rule: 'simple' as const, limits: [{ key: 'mean', lower: 58 }, { key: 'standardDeviation', upper: 1 }] }
    expect(verdict(both, [result('mean', 60)]).outcome).toBe('undecided')
    expect(verdict(both, [result('mean', 50)]).outcome).toBe('fail')
  })
  it('guards by the expanded uncertainty', () => {
    const guarded = (value: number, u?: number) => verdict({ rule: 'guarded', limits: [{ key: 'mean', lower: 355 }] }, [result('mean', value, u)])
    expect(guarded(361, 6).outcome).toBe('pass')
    expect(guarded(358, 6)).toMatchObject({ outcome: 'undecided', limits: [{ probabilityOfConformity: expect.closeTo(0.841345, 5) }] })
    expect(guarded(348.9, 6).outcome).toBe('fail')
    expect(guarded(400).outcome).toBe('undecided')
  })
  it('never turns a fail into a pass when a limit is moved inward', () => {
    const number = fc.integer({ min: -5000, max: 5000 }).map((value) => value / 100)
    const size = fc.integer({ min: 0, max: 3000 }).map((value) => value / 100)
    fc.assert(fc.property(number, fc.option(fc.double({ min: 0, max: 10, noNaN: true }), { nil: undefined }), number, size, size, fc.constantFrom('simple' as const, 'guarded' as const), (value, u, lower, width, inward, rule) => {
      const order = ['fail', 'undecided', 'pass']
      const outcome = (lo: number, hi: number) => verdict({ rule, limits: [{ key: 'mean', lower: lo, upper: hi }] }, [result('mean', value, u)]).outcome
      const shift = Math.min(inward, width / 2)
      expect(order.indexOf(outcome(lower + shift, Math.max(lower + shift, lower + width - shift)))).toBeLessThanOrEqual(order.indexOf(outcome(lower, lower + width)))
    }))
  })
  it.each([
    ['no limits', { rule: 'simple', limits: [] }], ['an empty limit', { rule: 'simple', limits: [{ key: 'mean' }] }], ['crossed limits', { rule: 'simple', limits: [{ key: 'mean', lower: 2, upper: 1 }] }],
    ['an unknown rule', { rule: 'strict', limits: [{ key: 'mean', lower: 2 }] }], ['an unknown key', { rule: 'simple', limits: [{ key: 'mean', lower: 2, guard: 1 }] }],
  ])('refuses a requirement with %s', (_, requirement) => expect(Requirement.safeParse(requirement).success).toBe(false))
})
