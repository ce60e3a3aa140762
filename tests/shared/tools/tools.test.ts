import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../../shared/evaluate.ts'

const run = (tool: string, input: Record<string, unknown>) => evaluate({ tool, ...input }) as unknown as Record<string, unknown>
const refused = (tool: string, input: Record<string, unknown>) => {
  const answer = run(tool, input) as { error?: { code: string; issues: { path: (string | number)[] }[] } }
  return answer.error && [answer.error.code, ...answer.error.issues.map((issue) => issue.path.join('.'))]
}

describe('round', () => {
  it('rounds decimal strings', () => {
    expect(run('round', { value: '12.345', increment: '0.05', rule: 'half-even' })).toEqual({ tool: 'round', rounded: '12.35' })
    expect(run('round', { value: '123456789012345678901234567890.5', increment: '1', rule: 'half-up' })).toEqual({ tool: 'round', rounded: '123456789012345678901234567891' })
  })
  it.each([
    [{ value: 12.345, increment: '0.05', rule: 'half-even' }, 'value'], [{ value: '12,3', increment: '0.05', rule: 'half-even' }, 'value'], [{ value: '1', increment: '0', rule: 'half-even' }, 'increment'],
    [{ value: '1', increment: '-0.1', rule: 'half-even' }, 'increment'], [{ value: '1', increment: '1', rule: 'up' }, 'rule'], [{ value: '1', increment: '1' }, 'rule'], [{ value: '1', increment: '1', rule: 'half-up', digits: 2 }, 'digits'],
  ])('refuses %j', (input, field) => expect(refused('round', input)).toEqual(['invalid-input', field]))
})

describe('summary', () => {
  it('leaves out what one value or equal values do not have', () => {
    expect(run('summary', { values: [4] })).toEqual({ tool: 'summary', count: 1, mean: 4 })
    expect(run('summary', { values: [4, 4] })).toEqual({ tool: 'summary', count: 2, mean: 4, standardDeviation: 0 })
  })
  it.each([[{ values: [] }, 'values'], [{ values: [1, null] }, 'values.1'], [{ values: ['1'] }, 'values.0'], [{}, 'values'], [{ values: [1], unit: 'mm' }, 'unit']])('refuses %j', (input, field) => {
    expect(refused('summary', input)).toEqual(['invalid-input', field])
  })
})

describe('t-quantile', () => {
  it('takes the cumulative probability', () => {
    // closed form for one degree of freedom: tan(π (p − 1/2))
    expect(run('t-quantile', { probability: 0.75, degreesOfFreedom: 1 }).value).toBeCloseTo(1, 12)
    expect(run('t-quantile', { probability: 0.25, degreesOfFreedom: 1 }).value).toBeCloseTo(-1, 12)
  })
  it.each([[{ probability: 1, degreesOfFreedom: 3 }, 'probability'], [{ probability: 0, degreesOfFreedom: 3 }, 'probability'], [{ probability: 0.5, degreesOfFreedom: 0 }, 'degreesOfFreedom']])('refuses %j', (input, field) => {
    expect(refused('t-quantile', input)).toEqual(['invalid-input', field])
  })
  it('says so when the answer is too large for a number', () => {
    expect(refused('t-quantile', { probability: 0.99999, degreesOfFreedom: 0.001 })).toEqual(['outside-range', ''])
  })
})

describe('combine-uncertainty', () => {
  it('has null for infinite degrees of freedom', () => {
    expect(run('combine-uncertainty', { components: [{ standardUncertainty: 3 }, { standardUncertainty: 4 }] })).toMatchObject({ combined: 5, effectiveDegreesOfFreedom: null, coverageFactor: expect.closeTo(2, 4) })
  })
  it('cuts the degrees of freedom for k only', () => {
    // JCGM 100:2008 Table G.2: t for 95.45 % at 4 degrees of freedom is 2.87
    const answer = run('combine-uncertainty', { components: [{ standardUncertainty: 1, degreesOfFreedom: 4.7 }] })
    expect(answer.effectiveDegreesOfFreedom).toBeCloseTo(4.7, 12)
    expect(answer.coverageFactor).toBeCloseTo(2.87, 2)
  })
  it.each([
    [{ components: [] }, 'components'], [{ components: [{ standardUncertainty: -1 }] }, 'components.0.standardUncertainty'], [{ components: [{ standardUncertainty: 1, degreesOfFreedom: 0.5 }] }, 'components.0.degreesOfFreedom'],
    [{ components: [{ standardUncertainty: 1 }], confidence: 1 }, 'confidence'], [{ components: [{ standardUncertainty: 1 }], confidence: 95 }, 'confidence'],
  ])('refuses %j', (input, field) => expect(refused('combine-uncertainty', input)).toEqual(['invalid-input', field]))
})

describe('conformity', () => {
  it('answers outcome, guard band and probability', () => {
    expect(run('conformity', { value: 358, expandedUncertainty: 6, lower: 355, rule: 'guarded' })).toEqual({ tool: 'conformity', outcome: 'undecided', guardBand: 6, probabilityOfConformity: expect.closeTo(0.841345, 5) })
    expect(run('conformity', { value: 358, expandedUncertainty: 9, coverageFactor: 3, lower: 355, rule: 'simple' })).toEqual({ tool: 'conformity', outcome: 'pass', guardBand: 0, probabilityOfConformity: expect.closeTo(0.841345, 5) })
    expect(run('conformity', { value: 358, expandedUncertainty: 0, lower: 355, rule: 'guarded' })).toEqual({ tool: 'conformity', outcome: 'pass', guardBand: 0, probabilityOfConformity: 1 })
  })
  it.each([
    [{ value: 1, expandedUncertainty: 1, rule: 'simple' }, 'lower'], [{ value: 1, expandedUncertainty: 1, lower: 2, upper: 1, rule: 'simple' }, 'lower'], [{ value: 1, expandedUncertainty: -1, lower: 1, rule: 'simple' }, 'expandedUncertainty'],
    [{ value: 1, expandedUncertainty: 1, coverageFactor: 0, lower: 1, rule: 'simple' }, 'coverageFactor'], [{ value: 1, lower: 1, rule: 'simple' }, 'expandedUncertainty'],
  ])('refuses %j', (input, field) => expect(refused('conformity', input)).toEqual(['invalid-input', field]))
})

describe('convert-hardness', () => {
  const question = { material: 'non-austenitic steel', table: 'ASTM E140', from: { scale: 'HRC', value: 45 }, to: ['HV'] }
  it.each([
    [{ material: 'austenitic steel' }, 'material'], [{ table: 'ASTM E141' }, 'table'], [{ from: { scale: 'HRX', value: 45 } }, 'from.scale'], [{ from: { scale: 'HRC', value: '45' } }, 'from.value'], [{ from: { scale: 'HRC', value: 1e9 } }, 'from.value'],
    [{ to: [] }, 'to'], [{ to: 'HV' }, 'to'], [{ to: ['HV', 'HX'] }, 'to.1'], [{ extra: 1 }, 'extra'],
  ])('refuses %j', (change, field) => expect(refused('convert-hardness', { ...question, ...change })).toEqual(['invalid-input', field]))
  it('rises with the hardness', () => {
    fc.assert(fc.property(fc.double({ min: 20, max: 68, noNaN: true }), fc.double({ min: 20, max: 68, noNaN: true }), (a, b) => {
      const hv = (value: number) => (run('convert-hardness', { ...question, from: { scale: 'HRC', value } }) as { values: [{ value: number }] }).values[0].value
      expect(hv(Math.min(a, b))).toBeLessThanOrEqual(hv(Math.max(a, b)))
    }))
  })
})
