import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { rockwell } from '../../../shared/hardness/rockwell.ts'
import { indentationDiameter, rockwellDepth } from '../../../shared/hardness/rockwell/rockwell-depth.ts'
import { rockwellScale, rockwellScales } from '../../../shared/hardness/rockwell/rockwell-scale.ts'

const flat = { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }
const readingsOf = (...values: number[]) => values.map((value) => ({ value }))
const run = (readings: unknown, parameters: unknown = flat) => rockwell.evaluate({ parameters, readings })
const codes = (readings: unknown, parameters: unknown = flat) => run(readings, parameters).checks.map((check) => check.code)

describe('rockwell', () => {
  it('gives five results in order, four for one reading', () => {
    expect(run(readingsOf(45, 46, 47)).results.map((result) => result.key)).toEqual(['mean', 'range', 'minimum', 'maximum', 'standardDeviation'])
    expect(run(readingsOf(45)).results.map((result) => result.key)).toEqual(['mean', 'range', 'minimum', 'maximum'])
  })
  it('does not mind the order of the readings', () => {
    fc.assert(fc.property(fc.array(fc.integer({ min: 200, max: 700 }), { minLength: 2, maxLength: 12 }), (tenths) => {
      const values = tenths.map((value) => value / 10)
      const [there, back] = [values, [...values].reverse()].map((list) => run(readingsOf(...list)).results)
      there!.forEach((result, i) => {
        expect(back![i]!.reported).toBe(result.reported)
        expect(back![i]!.value).toBeCloseTo(result.value, 10)
      })
    }))
  })
  it('ends every derivation in what is reported', () => {
    const cylinder = { ...flat, surface: { shape: 'cylinder', diameterMm: 11 } }
    for (const result of [...run(readingsOf(45, 46.2, 47)).results, ...run(readingsOf(32.5, 33), cylinder).results]) {
      expect(result.derivation.length).toBeGreaterThanOrEqual(3)
      expect(result.derivation.at(-1)?.reported).toBe(result.reported)
      expect(result.basis).toBe('ASTM E18-22')
    }
    expect(run(readingsOf(32.5, 33), cylinder).results[0]?.derivation.some((step) => step.text.includes('corrected'))).toBe(true)
  })
  it('warns below three readings', () => {
    expect(codes(readingsOf(45, 46))).toEqual(['too-few-readings'])
    expect(codes(readingsOf(45, 46, 47))).toEqual([])
  })
  it.each(rockwellScales)('knows the range of %s', (scale) => {
    const { from, to } = rockwellScale[scale]
    const iso = { standard: 'ISO 6508-1', scale, surface: { shape: 'flat' } }
    expect(codes(readingsOf(from, to, (from + to) / 2), iso)).toEqual([])
    expect(run(readingsOf(from - 0.1, to, to), iso).checks).toMatchObject([{ code: 'outside-scale', severity: 'error', reading: 0 }])
    expect(run(readingsOf(to, to, to + 0.1), iso).checks).toMatchObject([{ code: 'outside-scale', severity: 'error', reading: 2 }])
  })
  it('measures spacing and edges in diameters of the print', () => {
    const d = indentationDiameter('HRC', rockwellDepth('HRC', 45))
    expect(d).toBeCloseTo(2 * (0.1 + (0.11 - 0.2 * (1 - Math.sqrt(3) / 2)) * Math.sqrt(3)), 12)
    const row = (gap: number, edgeMm: number) => [0, 1, 2].map((i) => ({ value: 45, xMm: i * gap, yMm: 0, edgeMm }))
    expect(codes(row(3 * d, 2.5 * d))).toEqual([])
    expect(run(row(3 * d - 0.001, 5)).checks.map(({ code, reading }) => [code, reading])).toEqual([['spacing', 1], ['spacing', 2]])
    expect(codes(row(5, 2.5 * d - 0.001))).toEqual(['edge-distance', 'edge-distance', 'edge-distance'])
  })
  it('takes the larger print of a pair', () => {
    const d = indentationDiameter('HRC', rockwellDepth('HRC', 25))
    const pair = (gap: number) => [{ value: 65, xMm: 0 }, { value: 25, xMm: gap }, { value: 45 }]
    expect(codes(pair(3 * d - 0.001))).toEqual(['spacing'])
    expect(codes(pair(3 * d + 0.001))).toEqual([])
  })
  it('checks ten thousand placed readings at once', () => {
    const grid = Array.from({ length: 10_000 }, (_, i) => ({ value: 45, xMm: (i % 100) * 2, yMm: Math.floor(i / 100) * 2 }))
    expect(codes(grid)).toEqual([])
    expect(codes(grid.map((reading) => ({ ...reading, xMm: 0, yMm: 0 })))).toHaveLength(9_999)
  }, 60_000)
  it('asks 10 depths of thickness, 15 for a ball under ISO', () => {
    const ball = (standard: string, thicknessMm: number) => codes(readingsOf(80, 80, 80), { standard, scale: 'HRBW', surface: { shape: 'flat' }, thicknessMm })
    expect(ball('ASTM E18', 1)).toEqual([])
    expect(ball('ASTM E18', 0.99)).toEqual(['thickness'])
    expect(ball('ISO 6508-1', 1.5)).toEqual([])
    expect(ball('ISO 6508-1', 1.49)).toEqual(['thickness'])
  })
  it('warns under ISO of corrections that ISO does not print', () => {
    const cylinder = (standard: string, value: number) => codes(readingsOf(value, value, value), { standard, scale: 'HRC', surface: { shape: 'cylinder', diameterMm: 10 } })
    expect(cylinder('ISO 6508-1', 30)).toEqual(['cylinder-correction'])
    expect(cylinder('ISO 6508-1', 35)).toEqual([])
    expect(cylinder('ASTM E18', 30)).toEqual([])
  })
  it('offers lighter scales for a thin sheet and a flat for an uncorrectable cylinder', () => {
    const sheet = (thicknessMm: number) => ({ form: 'sheet' as const, thicknessMm })
    expect(rockwell.misfits(flat, sheet(2))).toEqual([])
    const [thin] = rockwell.misfits(flat, sheet(0.4))
    expect(thin?.message).toContain('0.4 mm is too thin for HRC at any hardness')
    expect(thin?.cures.map((cure) => cure.parameters.scale)).toContain('HR15N')
    for (const cure of thin!.cures) expect(rockwell.misfits({ ...flat, ...cure.parameters }, sheet(0.4))).toEqual([])
    const [curved] = rockwell.misfits({ ...flat, surface: { shape: 'cylinder', diameterMm: 50 } }, { form: 'bar', diameterMm: 50 })
    expect(curved?.cures).toEqual([{ label: 'Test on a flat', parameters: { surface: { shape: 'flat' } } }])
    const [narrow] = rockwell.misfits(flat, { form: 'wire', diameterMm: 1 })
    expect(narrow?.cures.map((cure) => cure.parameters.scale)).toContain('HR15N')
    expect(rockwell.misfits(flat, { form: 'bar', diameterMm: 40 })).toEqual([])
  })
  it('suggests parameters that it takes itself', () => {
    for (const piece of [undefined, { form: 'bar' as const, diameterMm: 30 }, { form: 'sheet' as const, thicknessMm: 1 }, { form: 'plate' as const, thicknessMm: 12 }]) {
      const parameters = rockwell.suggest(piece)
      expect(() => rockwell.parameters.parse(parameters)).not.toThrow()
      if (piece) expect(rockwell.misfits(parameters, piece)).toEqual([])
    }
  })
  it('says what it is on labels, plans and reports', () => {
    expect(rockwell.label(flat)).toBe('Rockwell HRC')
    expect(rockwell.summary(flat)).toBe('ASTM E18-22, 3 readings or more on a flat')
    expect(rockwell.needs(flat).map((step) => [step.kind, step.capability])).toEqual([['section', 'section'], ['measure', 'rockwell']])
    expect(rockwell.needs({ ...flat, surface: { shape: 'cylinder', diameterMm: 20 } }).map((step) => step.kind)).toEqual(['measure'])
    expect(rockwell.cautions(flat).at(-1)).toContain('come first')
    const lines = rockwell.report({ parameters: flat, readings: readingsOf(45, 46), results: [] })
    expect(lines.join('\n')).toContain('diamond cone, total force 150 kgf')
    expect(lines.join('\n')).toContain('45, 46 HRC')
  })
  it('offers the mean by the table of its standard, with its caution', () => {
    const converted = (standard: string, scale: string, value: number) => {
      const parameters = { standard, scale, surface: { shape: 'flat' } }
      return rockwell.conversions!({ parameters, results: run(readingsOf(value, value, value), parameters).results })
    }
    // ASTM E140-12b Table 1 and A370 Table 2 at 45 HRC; ISO 18265:2013 Table A.1 at 40.8 HRC
    expect(converted('ASTM E18', 'HRC', 45)).toMatchObject([{ table: expect.stringContaining('E140'), caution: expect.stringContaining('not for acceptance'), values: [{ reported: '446 HV' }, { reported: '421 HBW' }, { reported: '1480 MPa' }] }])
    expect(converted('ISO 6508-1', 'HRC', 40.8)[0]?.values.map((value) => value.reported)).toEqual(['400 HV', '380 HBW', '1290 MPa'])
    expect(converted('ASTM E18', 'HRBW', 80)[0]?.values.map((value) => value.reported)).toEqual(['150 HV', '150 HBW', '495 MPa'])
    expect(converted('ASTM E18', 'HREW', 90)).toEqual([])
    expect(converted('ASTM E18', 'HRC', 69)).toEqual([])
  })
})
