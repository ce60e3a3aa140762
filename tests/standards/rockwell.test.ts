import { describe, expect, it } from 'vitest'
import { evaluate } from '../../shared/evaluate.ts'
import { rockwellDepth } from '../../shared/hardness/rockwell/rockwell-depth.ts'
import { depthsOfThickness } from '../../shared/hardness/rockwell/rockwell-rules.ts'
import type { RockwellScale } from '../../shared/hardness/rockwell/rockwell-scale.ts'
import type { Evaluation } from '../../shared/method/method.ts'

describe('Rockwell depth, closed form HR = N − h/S (ISO 6508-1:2016)', () => {
  it.each([
    ['HRC', 0.08, 60, 0.8], ['HRC', 0.1137, 43.15, 1.137], ['HRC', 0.1596, 20.2, 1.596], ['HRA', 0.0499, 75.05, 0.499], ['HRD', 0.0711, 64.45, 0.711], ['HRBW', 0.1043, 77.85, 1.565],
    ['HRBW', 0.1462, 56.9, 2.193], ['HREW', 0.0777, 91.15, 1.165], ['HR15N', 0.0083, 91.7, 0.083], ['HR30N', 0.0203, 79.7, 0.203], ['HR30N', 0.0415, 58.5, 0.415], ['HR15TW', 0.0119, 88.1, 0.179],
    ['HR30TW', 0.0333, 66.7, 0.5], ['HRHW', 0.0611, 99.45, 0.916],
  ] as [RockwellScale, number, number, number][])('%s: h = %d mm is %d, least thickness %s mm (10 h cone, 15 h ball)', (scale, depth, reading, thickness) => {
    expect(rockwellDepth(scale, reading)).toBeCloseTo(depth, 10)
    expect(depthsOfThickness('ISO 6508-1', scale) * depth).toBeCloseTo(thickness, 3)
    expect(codes('ISO 6508-1', scale, reading, { thicknessMm: Math.ceil(depthsOfThickness('ISO 6508-1', scale) * depth * 1e4) / 1e4 + 1e-4 })).not.toContain('thickness')
    expect(codes('ISO 6508-1', scale, reading, { thicknessMm: depthsOfThickness('ISO 6508-1', scale) * depth - 0.001 })).toContain('thickness')
  })
})

describe('corrections for convex cylinders, ASTM E18-22 (three public reprints)', () => {
  it.each([
    ['HRC', 30, 10, 33.5], ['HRC', 55, 25, 55.5], ['HRBW', 80, 6.4, 85], ['HRBW', 60, 19, 62.5], ['HRC', 20, 6.4, 26], ['HRA', 80, 19, 80.5], ['HRD', 45, 13, 46.5], ['HRFW', 100, 25, 100.5], ['HRGW', 0, 6.4, 12.5],
    // closed form: linear between the table's rows and columns
    ['HRC', 32.5, 10, 35.75], ['HRC', 30, 11.5, 33], ['HRC', 32.5, 11.5, 35.25], ['HRBW', 75, 8.2, 79.625],
  ])('%s reading %d on %d mm stands for %d', (scale, reading, diameterMm, expected) => {
    const { results } = rockwell('ASTM E18', scale, [reading], { surface: { shape: 'cylinder', diameterMm } })
    expect(results[0]?.value).toBeCloseTo(expected, 10)
  })
  it.each([['HRC', 30, 6.3], ['HRC', 30, 38.1], ['HRBW', 60, 25.1], ['HRC', 19.9, 10], ['HRC', 90.5, 10], ['HR30N', 60, 10], ['HREW', 80, 10]])('%s reading %d on %d mm has no answer', (scale, reading, diameterMm) => {
    expect(evaluate(caseOf('ASTM E18', scale, [reading], { surface: { shape: 'cylinder', diameterMm } }))).toMatchObject({ method: 'rockwell', error: { code: 'outside-range' } })
  })
})

describe('reported values', () => {
  // ASTM E18 to 0.1 HR, ISO 6508-1 to 0.5 HR, half to even (ISO 80000-1:2009, ASTM E29), from memory
  it.each([
    ['ASTM E18', 'HRC', [45.1, 45.3, 45.4], '45.3 HRC'], ['ISO 6508-1', 'HRC', [45.1, 45.3, 45.4], '45.5 HRC'], ['ISO 6508-1', 'HRC', [62.2, 62.3], '62.0 HRC'],
    ['ASTM E18', 'HRBW', [62.2, 62.3], '62.2 HRBW'], ['ISO 6508-1', 'HR30TW', [70, 70, 70], '70.0 HR30TW'], ['ISO 6508-1', 'HRD', [64.45], '64.5 HRD'],
  ] as const)('%s %s %j is %s', (standard, scale, readings, reported) => {
    expect(rockwell(standard, scale, [...readings]).results[0]?.reported).toBe(reported)
  })
})

describe('uncertainty', () => {
  it('adds the spread of the readings to the components (closed form, JCGM 100:2008)', () => {
    const input = { ...caseOf('ISO 6508-1', 'HRC', [52.1, 52.4, 51.9, 52.3, 52.2]), uncertainty: { components: [{ name: 'reference block', standardUncertainty: 0.15 }, { name: 'machine', standardUncertainty: 0.0666 }] } }
    const [mean] = (evaluate(input) as Evaluation).results
    const spread = 0.19235384 / Math.sqrt(5)
    const combined = Math.hypot(0.15, 0.0666, spread)
    // 4 (u/u_spread)⁴ = 86.1 degrees of freedom; t for 86 by Abramowitz and Stegun 26.7.5 at z = 2
    expect(Math.floor(4 * (combined / spread) ** 4)).toBe(86)
    const t = 2 + (8 + 2) / (4 * 86) + (5 * 32 + 16 * 8 + 3 * 2) / (96 * 86 ** 2)
    expect(mean!.coverageFactor).toBeCloseTo(t, 4)
    expect(mean!.expandedUncertainty).toBeCloseTo(t * combined, 4)
  })
})

function caseOf(standard: string, scale: string, readings: number[], more: Record<string, unknown> = {}) {
  return { method: 'rockwell', parameters: { standard, scale, surface: { shape: 'flat' }, ...more }, readings: readings.map((value) => ({ value })) }
}
function rockwell(standard: string, scale: string, readings: number[], more: Record<string, unknown> = {}): Evaluation {
  const answer = evaluate(caseOf(standard, scale, readings, more))
  expect(answer).not.toHaveProperty('error')
  return answer as Evaluation
}
function codes(standard: string, scale: string, reading: number, more: Record<string, unknown>): string[] {
  return rockwell(standard, scale, [reading], more).checks.map((check) => check.code)
}
