import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluate } from '../../shared/evaluate.ts'

const rockwell = {
  method: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, readings: [{ value: 45.1 }, { value: 45.3 }, { value: 45.4 }],
}
const refused = (input: unknown) => {
  const answer = evaluate(input) as { error?: { code: string; issues: { path: (string | number)[]; message: string }[] } }
  return answer.error && [answer.error.code, ...answer.error.issues.map((issue) => issue.path.join('.'))]
}

describe('evaluate', () => {
  it('answers a method in the order of the contract', () => {
    const answer = evaluate({ ...rockwell, requirement: { limits: [{ key: 'mean', lower: 45 }], rule: 'simple' } })
    expect(Object.keys(answer)).toEqual(['method', 'results', 'checks', 'verdict'])
    expect(answer).toMatchObject({ method: 'rockwell', checks: [], verdict: { outcome: 'pass', rule: 'simple', limits: [{ key: 'mean', lower: 45, outcome: 'pass' }] } })
    expect(evaluate(rockwell)).not.toHaveProperty('verdict')
  })
  it('gives the same answer after a trip through JSON', () => {
    expect(evaluate(JSON.parse(JSON.stringify(rockwell)))).toEqual(JSON.parse(JSON.stringify(evaluate(rockwell))))
  })
  it('guards by the uncertainty given', () => {
    const guarded = (lower: number, standardUncertainty: number) => evaluate({ ...rockwell, requirement: { limits: [{ key: 'mean', lower }], rule: 'guarded' }, uncertainty: { components: [{ name: 'machine', standardUncertainty }] } })
    expect(guarded(44, 0.4)).toMatchObject({ verdict: { outcome: 'pass' } })
    expect(guarded(45, 0.4)).toMatchObject({ verdict: { outcome: 'undecided' } })
    expect(guarded(47, 0.4)).toMatchObject({ verdict: { outcome: 'fail' } })
    expect(evaluate({ ...rockwell, requirement: { limits: [{ key: 'mean', lower: 44 }], rule: 'guarded' } })).toMatchObject({ verdict: { outcome: 'undecided' } })
  })
  it.each([
    ['a reading that is text', { readings: [{ value: '45' }] }, ['readings.0.value']],
    ['a reading that is null', { readings: [null] }, ['readings.0']],
    ['a reading out of the question', { readings: [{ value: 45 }, { value: 131 }] }, ['readings.1.value']],
    ['a negative reading', { readings: [{ value: -1 }] }, ['readings.0.value']],
    ['infinity', { readings: [{ value: Infinity }] }, ['readings.0.value']],
    ['NaN', { readings: [{ value: NaN }] }, ['readings.0.value']],
    ['a negative edge distance', { readings: [{ value: 45, edgeMm: -1 }] }, ['readings.0.edgeMm']],
    ['no readings', { readings: [] }, ['readings']],
    ['readings as an object', { readings: { value: 45 } }, ['readings']],
    ['missing readings', { readings: undefined }, ['readings']],
    ['missing parameters', { parameters: undefined }, ['parameters']],
    ['an unknown key of a reading', { readings: [{ value: 45, remark: 'x' }] }, ['readings.0.remark']],
    ['an unknown key of the case', { reading: [] }, ['reading']],
    ['an unknown key of the parameters', { parameters: { ...rockwell.parameters, load: 150 } }, ['parameters.load']],
    ['an unknown scale', { parameters: { ...rockwell.parameters, scale: 'HRX' } }, ['parameters.scale']],
    ['an unknown standard', { parameters: { ...rockwell.parameters, standard: 'ASTM E10' } }, ['parameters.standard']],
    ['an unknown surface', { parameters: { ...rockwell.parameters, surface: { shape: 'ball' } } }, ['parameters.surface.shape']],
    ['a cylinder without a diameter', { parameters: { ...rockwell.parameters, surface: { shape: 'cylinder' } } }, ['parameters.surface.diameterMm']],
    ['a flat with a diameter', { parameters: { ...rockwell.parameters, surface: { shape: 'flat', diameterMm: 10 } } }, ['parameters.surface.diameterMm']],
    ['a negative thickness', { parameters: { ...rockwell.parameters, thicknessMm: -1 } }, ['parameters.thicknessMm']],
    ['an absurd thickness', { parameters: { ...rockwell.parameters, thicknessMm: 1e9 } }, ['parameters.thicknessMm']],
    ['a requirement without a rule', { requirement: { limits: [{ key: 'mean', lower: 1 }] } }, ['requirement.rule']],
    ['a limit on an unknown result', { requirement: { limits: [{ key: 'average', lower: 1 }], rule: 'simple' } }, ['requirement.limits.0.key']],
    ['a negative uncertainty', { uncertainty: { components: [{ name: 'a', standardUncertainty: -1 }] } }, ['uncertainty.components.0.standardUncertainty']],
    ['an uncertainty without components', { uncertainty: { components: [] } }, ['uncertainty.components']],
    ['two faults at once', { readings: [{ value: 'x' }], requirement: { limits: [], rule: 'simple' } }, ['requirement.limits', 'readings.0.value']],
  ])('refuses %s', (_, change, paths) => {
    expect(refused({ ...rockwell, ...change })).toEqual(['invalid-input', ...paths])
  })
  it.each([[3], ['rockwell'], [null], [undefined], [[]], [true], [{}], [{ method: 3 }], [{ tool: null }], [{ method: 'rockwell', tool: 'round' }]])('refuses %j, which is no case', (input) => {
    expect(refused(input)?.[0]).toBe('invalid-input')
  })
  it.each(['rockwel', '', 'constructor', '__proto__', 'toString', 'round'])('knows no method %j', (method) => {
    expect(evaluate({ method })).toMatchObject({ method, error: { code: 'unknown-method' } })
  })
  it.each(['rounds', '', 'constructor', '__proto__', 'rockwell'])('knows no tool %j', (tool) => {
    expect(evaluate({ tool })).toMatchObject({ tool, error: { code: 'unknown-tool' } })
  })
  it('refuses a prototype smuggled in as a key', () => {
    expect(refused(JSON.parse('{"method":"rockwell","parameters":{"standard":"ASTM E18","scale":"HRC","surface":{"shape":"flat"},"__proto__":{}},"readings":[{"value":45}]}'))).toEqual(['invalid-input', 'parameters.__proto__'])
    expect(refused(JSON.parse('{"tool":"summary","values":[1],"__proto__":{}}'))).toEqual(['invalid-input', '__proto__'])
  })
  it('tells the same fault of a long list a few times only', () => {
    const answer = evaluate({ tool: 'summary', values: Array.from({ length: 100_000 }, () => 'x') }) as { error: { issues: unknown[] } }
    expect(answer.error.issues.length).toBeLessThanOrEqual(50)
  })
  it('answers anything at all without throwing', () => {
    fc.assert(fc.property(fc.anything({ maxDepth: 4 }), fc.anything({ maxDepth: 4 }), fc.constantFrom('rockwell', 'grain-intercept', 'tensile'), (parameters, readings, method) => {
      expect(evaluate({ method, parameters, readings })).toHaveProperty('error')
    }))
  })
})
