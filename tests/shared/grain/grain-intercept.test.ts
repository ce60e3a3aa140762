import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { grainIntercept } from '../../../shared/grain/grain-intercept.ts'
import { grainSizeNumber } from '../../../shared/grain/grain-size-number.ts'

const parameters = { standard: 'ASTM E112' }
const run = (readings: unknown, more: Record<string, unknown> = {}) => grainIntercept.evaluate({ parameters, readings, ...more })
const fields = (...counts: number[]) => counts.map((intersections) => ({ lineLengthMm: 5, intersections }))
const keys = (readings: unknown) => run(readings).results.map((result) => result.key)
const codes = (readings: unknown) => run(readings).checks.map((check) => check.code)

describe('grain size by intercept', () => {
  it('falls by two when the intercept doubles', () => {
    fc.assert(fc.property(fc.double({ min: 1e-3, max: 1e5, noNaN: true }), fc.constantFrom('ASTM E112' as const, 'ISO 643' as const), (perMm, standard) => {
      expect(grainSizeNumber(perMm, standard) - grainSizeNumber(perMm / 2, standard)).toBeCloseTo(2, 9)
    }))
    expect(() => grainSizeNumber(0, 'ISO 643')).toThrow(RangeError)
  })
  it('pools fields of unlike length', () => {
    const [perMm, intercept] = run([{ lineLengthMm: 2, intersections: 30 }, { lineLengthMm: 8, intersections: 150 }, { lineLengthMm: 5, intersections: 60 }]).results
    expect(perMm?.value).toBe(240 / 15)
    expect(intercept?.value).toBe(15 / 240)
  })
  it('does not mind the order of the fields', () => {
    fc.assert(fc.property(fc.array(fc.integer({ min: 20, max: 300 }), { minLength: 2, maxLength: 8 }), (halves) => {
      const counts = halves.map((value) => value / 2)
      const back = run(fields(...[...counts].reverse())).results
      run(fields(...counts)).results.forEach((result, i) => expect(back[i]?.value).toBeCloseTo(result.value, 9))
    }))
  })
  it('gives five results, three for a single field', () => {
    expect(keys(fields(80, 85, 90))).toEqual(['interceptsPerMm', 'meanIntercept', 'grainSize', 'confidence95', 'relativeAccuracy'])
    expect(keys(fields(80))).toEqual(['interceptsPerMm', 'meanIntercept', 'grainSize'])
  })
  it('leaves out a confidence wider than the mean', () => {
    expect(keys(fields(1, 200))).toEqual(['interceptsPerMm', 'meanIntercept', 'grainSize', 'relativeAccuracy'])
  })
  it('reports G to 0.1 and says how', () => {
    const results = run(fields(87, 87, 87.5)).results
    expect(results[2]?.reported).toBe('G 5.0')
    for (const result of results) expect(result.derivation.at(-1)?.reported).toBe(result.reported)
  })
  it('checks fields and counts on both sides of their limits', () => {
    expect(codes(fields(25, 25))).toEqual(['too-few-fields'])
    expect(codes(fields(17, 16, 17))).toEqual([])
    expect(codes(fields(16.5, 16.5, 16.5))).toEqual(['too-few-counts'])
    expect(codes(fields(10))).toEqual(['too-few-fields', 'too-few-counts'])
    expect(codes(fields(100.3, 100, 100))).toEqual(['count-in-halves'])
  })
  it('has no answer where nothing was counted', () => {
    expect(() => run(fields(0, 0, 0))).toThrow(RangeError)
  })
  it('adds the scatter between fields to the uncertainty of G', () => {
    const size = run(fields(87, 90, 80), { uncertainty: { components: [{ name: 'line length', standardUncertainty: 0.05 }] } }).results[2]!
    // closed form: u = 2/ln 2 × s/(√n mean)
    const spread = (2 / Math.LN2) * (5.131601439446884 / Math.sqrt(3) / (257 / 3))
    expect(size.expandedUncertainty! / size.coverageFactor!).toBeCloseTo(Math.hypot(0.05, spread), 10)
  })
  it.each([
    ['no fields', []], ['both counts', [{ lineLengthMm: 1, intersections: 1, intercepts: 1 }]], ['no count', [{ lineLengthMm: 1 }]],
    ['mixed counts', [{ lineLengthMm: 1, intersections: 1 }, { lineLengthMm: 1, intercepts: 1 }]], ['a negative count', fields(-1)], ['no length', [{ lineLengthMm: 0, intersections: 5 }]], ['an unknown key', [{ lineLengthMm: 1, intersections: 5, length: 4 }]],
  ])('refuses %s', (_, readings) => {
    expect(() => run(readings)).toThrow(expect.objectContaining({ name: 'ZodError' }))
  })
  it('speaks of the lab\'s own safety sheet and of dry picric acid', () => {
    const text = grainIntercept.cautions(parameters).join('\n')
    expect(text).toContain('safety sheet')
    expect(text).toContain('picric acid is explosive when dry')
    expect(text).toContain('fume hood')
  })
  it('plans five steps and refuses a section too small', () => {
    expect(grainIntercept.needs(parameters).map((step) => step.kind)).toEqual(['section', 'mount', 'grind and polish', 'etch', 'measure'])
    expect(grainIntercept.misfits(parameters, { form: 'wire', diameterMm: 0.3 })).toHaveLength(1)
    expect(grainIntercept.misfits(parameters, { form: 'bar', diameterMm: 30 })).toEqual([])
    expect(grainIntercept.label(parameters)).toBe('Grain size, intercept')
    expect(grainIntercept.report({ parameters, readings: fields(87, 90, 80), results: [] })[1]).toContain('3 fields')
  })
})
