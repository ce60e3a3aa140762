import { describe, expect, it } from 'vitest'
import { tensilePicture } from '../../../shared/tensile/curve.ts'
import { decimalNumber, loadExtensionRecord, RecordError, type RecordChoices, type TextTable } from '../../../shared/tensile/record.ts'
import { TensileParameters } from '../../../shared/tensile/tensile-parameters.ts'
import { thinned } from '../../../shared/tensile/thinned.ts'
import { area, ductile, gauge } from './pull.ts'

const table: TextTable = { names: ['t', 'F', 'dL'], columns: [['0', '0,5', '1', ''], ['0', '1,25', '2,5', ''], ['0', '-0,1', '0,2', '']], headingRows: 2 }
const choices: RecordChoices = { extension: { column: 'dL', unit: '% of gauge length' }, force: { column: 'F', unit: 'kN' }, time: { column: 't', unit: 's' }, gaugeLengthMm: 50, decimal: ',' }

describe('a record read from text', () => {
  it('turns units and decimal commas into mm, N and s', () => {
    const { extensionMm, forceN, timeS } = loadExtensionRecord(table, choices)
    expect(forceN).toEqual([0, 1250, 2500])
    expect(extensionMm.map((value) => Number(value.toFixed(9)))).toEqual([0, -0.05, 0.1])
    expect(timeS).toEqual([0, 0.5, 1])
    const inches = loadExtensionRecord(table, { ...choices, extension: { column: 'dL', unit: 'in' }, force: { column: 'F', unit: 'lbf' } })
    expect(inches.extensionMm[2]).toBeCloseTo(5.08, 9)
    expect(inches.forceN[2]).toBeCloseTo(11.12055404, 7)
  })

  it('names row and column of what is no number', () => {
    const bad = { ...table, columns: [table.columns[0] ?? [], ['0', 'x1', '2,5'], ['0', '', '0,2']] }
    try {
      loadExtensionRecord(bad, choices)
      expect.unreachable()
    } catch (problem) {
      expect(problem).toBeInstanceOf(RecordError)
      expect(String(problem)).toContain('row 4, column "F": "x1" is no number')
      expect(String(problem)).toContain('row 4, column "dL": is empty')
    }
  })

  it('says which column is not there and what the gauge length is needed for', () => {
    expect(() => loadExtensionRecord(table, { ...choices, force: { column: 'Load', unit: 'N' } })).toThrow('column "Load": is not in the file, which has "t", "F", "dL"')
    expect(() => loadExtensionRecord(table, { ...choices, gaugeLengthMm: undefined })).toThrow('extensometer gauge length is not given')
  })

  it('takes no groups of thousands for decimals', () => {
    expect(decimalNumber('1,234.5', '.')).toBeUndefined()
    expect(decimalNumber('1.234,5', ',')).toBeUndefined()
    expect(decimalNumber(' -1,5e3 ', ',')).toBe(-1500)
  })
})

describe('the picture', () => {
  const parameters = TensileParameters.parse({ standard: 'ISO 6892-1', section: { shape: 'area', areaMm2: area }, extensometerGaugeLengthMm: gauge })
  const curve = { extensionMm: ductile().map(([strain]) => strain * gauge), forceN: ductile().map(([, stress]) => stress * area) }

  it('shows the same points as the results', () => {
    const picture = tensilePicture(parameters, { curve })
    expect(picture?.points.map((point) => point.name)).toEqual(['Rp', 'Rm', 'Agt', 'fracture'])
    const proof = picture?.points[0]
    const line = picture?.offsetLine
    expect(proof?.symbol).toBe('Rp0.2')
    expect((line?.slopeMPaPerPercent ?? 0) * ((proof?.strainPercent ?? 0) - (line?.zeroPercent ?? 0))).toBeCloseTo(proof?.stressMPa ?? NaN, 6)
    expect(picture?.elastic?.points).toBeGreaterThan(20)
    expect(tensilePicture({ ...parameters, extensometerGaugeLengthMm: undefined }, { curve })).toBeNull()
  })

  it('thins a long curve without losing its extremes', () => {
    const x = Array.from({ length: 100_000 }, (_, i) => i / 1000)
    const y = x.map((value, i) => (i === 54_321 ? 99 : i === 12_345 ? -99 : Math.sin(value)))
    const points = thinned(x, y, 500)
    expect(points.length).toBeLessThanOrEqual(4 * 501)
    expect(points.map(([, value]) => value)).toEqual(expect.arrayContaining([99, -99]))
    expect(points.every(([value], i) => i === 0 || value >= (points[i - 1]?.[0] ?? 0))).toBe(true)
    expect(thinned([0, 1, 2], [3, 4, 5], 100)).toEqual([[0, 3], [1, 4], [2, 5]])
  })
})
