import { describe, expect, it } from 'vitest'
import * as z from 'zod'
import { defineMethod } from '../../../shared/method/define-method.ts'
import { methods } from '../../../shared/methods.ts'

const length = defineMethod({
  id: 'length', version: 1, title: 'Length', standards: ['house'], mainResult: 'mean', measured: ['areaMm2'],
  parameters: z.strictObject({ kind: z.string(), areaMm2: z.number().positive() }),
  readings: z.array(z.strictObject({ mm: z.number() })).min(1),
  resultNames: [],
  suggest: () => ({ kind: 'x' }),
  label: ({ kind, areaMm2 }) => `${kind} ${areaMm2 ?? 'not measured yet'}`,
  summary: () => '', needs: () => [], misfits: () => [], cautions: () => [],
  evaluate: ({ readings }) => ({ results: [], checks: readings.map(({ mm }) => ({ code: String(mm), severity: 'info' as const, message: '' })) }),
  report: ({ readings }) => readings.map(({ mm }) => `${mm}`),
})

describe('a defined method', () => {
  it('parses strictly, with paths from the top', () => {
    const refused = (input: unknown) => {
      try {
        length.evaluate(input as Parameters<typeof length.evaluate>[0])
        return []
      } catch (error) {
        return error instanceof z.ZodError ? error.issues.map((issue) => issue.path.join('.')) : [error]
      }
    }
    expect(refused({ parameters: { kind: 'a', areaMm2: 1 }, readings: [{ mm: 1 }] })).toEqual([])
    expect(refused({ parameters: { kind: 'a', areaMm2: NaN }, readings: [{ mm: Infinity }, { mm: 1, x: 2 }] })).toEqual(['parameters.areaMm2', 'readings.0.mm', 'readings.1'])
    expect(refused({ parameters: { kind: 'a' }, readings: [] })).toEqual(['parameters.areaMm2', 'readings'])
    expect(refused({ readings: [{ mm: 1 }], more: 1 })).toEqual(['parameters', ''])
    expect(refused({ parameters: { kind: 'a', areaMm2: 1 }, readings: [{ mm: 1 }], uncertainty: { components: [{ name: 'u', standardUncertainty: -1 }] } })).toEqual(['uncertainty.components.0.standardUncertainty'])
  })
  it('lets what is measured at the bench be missing until then', () => {
    expect(length.label({ kind: 'a' })).toBe('a not measured yet')
    expect(length.label({ kind: 'a', areaMm2: 4 })).toBe('a 4')
    expect(() => length.label({ areaMm2: 4 })).toThrow()
    expect(() => length.label({ kind: 'a', other: 4 })).toThrow()
  })
  it('knows whether readings are rows', () => {
    expect(length.isSet).toBe(true)
    expect(Object.fromEntries(methods.map((method) => [method.id, method.isSet]))).toEqual({ rockwell: true, tensile: false, 'grain-intercept': true })
  })
})

describe.each(methods.map((method) => [method.id, method] as const))('%s', (_, method) => {
  it('names its main result among its results', () => {
    expect(method.resultNames.map((name) => name.key)).toContain(method.mainResult)
    expect(new Set(method.resultNames.map((name) => name.key)).size).toBe(method.resultNames.length)
  })
  it('can be labelled, planned and cautioned by what it suggests', () => {
    const parameters = method.suggest({ form: 'bar', diameterMm: 30 })
    expect(method.label(parameters)).not.toBe('')
    expect(method.summary(parameters)).not.toBe('')
    expect(method.needs(parameters).at(-1)?.capability).toBe(method.id)
    expect(method.cautions(parameters).length).toBeGreaterThan(0)
  })
})
