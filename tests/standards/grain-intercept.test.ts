import { describe, expect, it } from 'vitest'
import { evaluate } from '../../shared/evaluate.ts'
import { grainSizeNumber } from '../../shared/grain/grain-size-number.ts'
import type { Evaluation } from '../../shared/method/method.ts'

describe('grain size number', () => {
  // ASTM E112-13 Table 4, planar grains: G, mean intercept in µm (printed), intercepts per mm (printed); from memory, beside the formula
  it.each([
    [-1, 452.5, 2.21], [0.5, 269.1, 3.72], [1, 226.3, 4.42], [2, 160, 6.25], [2.5, 134.5, 7.43], [3.5, 95.1, 10.51], [4, 80, 12.5], [5, 56.6, 17.68], [5.5, 47.6, 21.02], [6.5, 33.6, 29.73],
    [7, 28.3, 35.36], [8, 20, 50], [8.5, 16.8, 59.46], [9.5, 11.9, 84.09], [10, 10, 100], [11, 7.1, 141.4], [12.5, 4.2, 237.8], [13, 3.5, 282.8], [14, 2.5, 400],
  ])('G %d has a mean intercept of %d µm and %d intercepts per mm', (size, interceptUm, perMm) => {
    for (const standard of ['ASTM E112', 'ISO 643'] as const) {
      expect(Math.abs(grainSizeNumber(perMm, standard) - size)).toBeLessThan(0.005)
      expect(Math.abs(grainSizeNumber(1000 / interceptUm, standard) - size)).toBeLessThan(0.05)
    }
  })
  // closed form: G = 6.643856 log10(N_L) − 3.288; magnification, line on the image in mm, intersections
  it.each([[100, 500, 87, 17.4, 57.47126, 4.954], [500, 500, 94.5, 94.5, 10.58201, 9.8365], [1000, 500, 103, 206, 4.85437, 12.085], [50, 500, 120, 12, 83.33333, 3.8819], [400, 500, 98, 78.4, 12.7551, 9.2976], [100, 300, 55.5, 18.5, 54.05405, 5.1309]])(
    '%d ×, %d mm, %d intersections', (magnification, line, intersections, perMm, interceptUm, size) => {
      const [perLength, intercept, grain] = count('ASTM E112', [{ lineLengthMm: line / magnification, intersections }]).results
      expect(perLength?.value).toBeCloseTo(perMm, 9)
      expect(intercept?.value).toBeCloseTo(interceptUm / 1000, 8)
      expect(grain?.value).toBeCloseTo(size, 4)
    })
  // ISO 643: mean intercept 0.320 × 2^(−G/2) mm (from memory)
  it.each([[1, 0.2263], [5, 0.05657], [8, 0.02], [10, 0.01], [16, 0.00125]])('ISO 643: G %d at %d mm', (size, interceptMm) => {
    expect(grainSizeNumber(1 / interceptMm, 'ISO 643')).toBeCloseTo(size, 2)
  })
})

describe('confidence between fields', () => {
  it('agrees with the closed form t s/√n on N_L (ASTM E112, t from its table, from memory)', () => {
    const fields = [143, 151, 138, 149, 142].map((intercepts) => ({ lineLengthMm: 10, intercepts }))
    const [perMm, , size, confidence, accuracy] = count('ASTM E112', fields).results
    expect(perMm?.value).toBeCloseTo(14.46, 9)
    expect(size?.value).toBeCloseTo(4.42, 2)
    expect(accuracy?.value).toBeCloseTo(4.568, 2)
    const half = 0.66054
    expect(confidence?.value).toBeCloseTo((6.643856 * (Math.log10(14.46 + half) - Math.log10(14.46 - half))) / 2, 4)
  })
  it('finds 27 % too wide for the usual 10 %', () => {
    // mean intercepts of 21.5, 29.8, 17.9, 25.2, 31.0 µm as counts on 10 mm
    const { checks } = count('ASTM E112', [465, 335.5, 558.5, 397, 322.5].map((intersections) => ({ lineLengthMm: 10, intersections })))
    expect(checks.map((check) => check.code)).toEqual(['relative-accuracy'])
  })
})

function count(standard: string, readings: unknown[]): Evaluation {
  const answer = evaluate({ method: 'grain-intercept', parameters: { standard }, readings })
  expect(answer).not.toHaveProperty('error')
  return answer as Evaluation
}
