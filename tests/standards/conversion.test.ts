import { describe, expect, it } from 'vitest'
import { evaluate } from '../../shared/evaluate.ts'

type Converted = { values: { scale: string; value: number; reported: string; informative: boolean }[]; approximate: boolean }

describe('ASTM E140 and A370, non-austenitic steel', () => {
  // entries of ASTM E140-12b Table 1, read in public charts; MPa of A370 Table 2 from memory
  it.each([
    ['HRC', 68, 'HV', 940], ['HRC', 68, 'HRA', 85.6], ['HRC', 60, 'HV', 697], ['HRC', 60, 'HR30N', 77.5], ['HRC', 55, 'tensileStrengthMPa', 2070],
    ['HRC', 45, 'HBW', 421], ['HRC', 40, 'HK', 402], ['HRC', 35, 'HRD', 51.5], ['HRC', 30, 'HR45N', 31.3], ['HRC', 20, 'HBW', 226], ['HV', 238, 'HRC', 20],
    ['HBW', 739, 'HRC', 65], ['tensileStrengthMPa', 760, 'HRC', 20],
    // ASTM E140-12b Table 2 and A370 Table 3, from memory
    ['HRB', 100, 'HV', 240], ['HRB', 100, 'HR30T', 83.1], ['HRB', 75, 'HRF', 99.6], ['HRB', 80, 'HBW', 150], ['HRB', 55, 'HR45T', 27.7], ['HRB', 65, 'tensileStrengthMPa', 385], ['HRF', 88.2, 'HV', 100],
  ])('%s %d is %s %d', (scale, value, to, expected) => {
    const [first] = converted('ASTM E140', scale, value, [to]).values
    expect(first?.value).toBe(expected)
  })
  // closed form: linear between the neighbouring rows of Table 1
  it.each([
    ['HRC', 34.5, 'HV', 340.5, '340 HV'], ['HRC', 61.4, 'HV', 730.4, '730 HV'], ['HV', 430, 'HRC', 43.636, '44 HRC'], ['HV', 675, 'HRC', 59.043, '59 HRC'],
    ['HBW', 388, 'HV', 409.778, '410 HV'], ['HRC', 29.4, 'tensileStrengthMPa', 938, '938 MPa'],
  ])('%s %d reads %s %d between the rows', (scale, value, to, expected, reported) => {
    const [first] = converted('ASTM E140', scale, value, [to]).values
    expect(first?.value).toBeCloseTo(expected, 3)
    expect(first?.reported).toBe(reported)
  })
  it('takes Table 1 where the two tables overlap and Table 2 for what Table 1 lacks', () => {
    const answer = converted('ASTM E140', 'HV', 239, ['HRC', 'HBW', 'HRB', 'HRA'])
    expect(answer.values.map((value) => value.scale)).toEqual(['HRC', 'HBW', 'HRB', 'HRA'])
    expect(answer.values[0]?.value).toBeCloseTo(20.2, 10)
    expect(answer.values[1]?.value).toBeCloseTo(227, 10)
    expect(answer.values[2]?.value).toBeCloseTo(99 + 5 / 6, 10)
    expect(answer.values[3]?.value).toBeCloseTo(60.6, 10)
    expect(answer.approximate).toBe(true)
  })
  it('marks bracketed entries, also when only one neighbour is bracketed', () => {
    const informative = (scale: string, value: number, to: string) => converted('ASTM E140', scale, value, [to]).values[0]?.informative
    expect(informative('HRC', 60, 'HBW')).toBe(true)
    expect(informative('HRC', 59.5, 'HBW')).toBe(true)
    expect(informative('HRC', 59, 'HBW')).toBe(false)
    expect(informative('HRC', 60, 'HV')).toBe(false)
    expect(informative('HBW', 660, 'HRC')).toBe(true)
  })
  it.each([
    ['HRC', 19.5, 'HV'], ['HRC', 68.1, 'HV'], ['HV', 84.9, 'HRB'], ['HV', 940.1, 'HRC'], ['HRC', 61, 'tensileStrengthMPa'], ['HRC', 59.1, 'tensileStrengthMPa'], ['HRC', 66, 'HBW'], ['HRC', 65.2, 'HBW'],
    ['HRB', 76, 'HRF'], ['HRB', 75.5, 'HRF'], ['HRC', 45, 'HRB'], ['HRB', 64, 'tensileStrengthMPa'], ['HRB', 54.9, 'HV'], ['HRC', -3, 'HV'],
  ])('has no answer for %s %d in %s', (scale, value, to) => {
    expect(convert('ASTM E140', scale, value, ['HV', to].slice(1))).toMatchObject({ tool: 'convert-hardness', error: { code: 'outside-range' } })
  })
  it('refuses the whole question when one scale has no answer', () => {
    expect(convert('ASTM E140', 'HRC', 61, ['HV', 'tensileStrengthMPa'])).toMatchObject({ error: { code: 'outside-range' } })
  })
})

describe('ISO 18265', () => {
  // Table A.1, one public file; Rm, HV, HBW and HRC up to 470 HV in a second public list
  it.each([
    ['HV', 240, 'HRB', 98.1, '98.1 HRB'], ['HV', 240, 'tensileStrengthMPa', 770, '770 MPa'], ['HV', 400, 'HRC', 40.8, '40.8 HRC'], ['HV', 650, 'HBW', 618, '618 HBW'], ['HRC', 64, 'HV', 800, '800 HV'], ['HV', 80, 'HBW', 76, '76 HBW'],
  ])('A.1: %s %d is %s %d', (scale, value, to, expected, reported) => {
    expect(converted('ISO 18265', scale, value, [to]).values[0]).toMatchObject({ value: expected, reported, informative: false })
  })
  // closed form: linear between the rows of A.1
  it.each([[25, 'HV', 266.2], [35, 'HBW', 328.5], [45, 'tensileStrengthMPa', 1442], [50, 'HV', 512.9], [55, 'HBW', 566.4], [55, 'tensileStrengthMPa', 1979]])('A.1: HRC %d reads %s %d between the rows', (hrc, to, expected) => {
    expect(Math.abs((converted('ISO 18265', 'HRC', hrc, [to]).values[0]?.value ?? NaN) - expected)).toBeLessThan(to === 'tensileStrengthMPa' ? 0.6 : 0.06)
  })
  it.each([
    ['ISO 18265 B.1', 'HV', 250, 'HRC', 22.9], ['ISO 18265 B.1', 'HV', 210, 'tensileStrengthMPa', 651], ['ISO 18265 B.2', 'HV', 200, 'HBW', 203], ['ISO 18265 B.2', 'HV', 240, 'HRC', 20.5],
    ['ISO 18265 B.3', 'HV', 700, 'HRC', 59.2], ['ISO 18265 C', 'HV', 400, 'HRC', 41.7], ['ISO 18265 D', 'HV', 800, 'HRC', 63.6],
  ])('%s: %s %d is %s %d (one public file)', (table, scale, value, to, expected) => {
    expect(converted(table, scale, value, [to]).values[0]?.value).toBe(expected)
  })
  it('marks bracketed entries', () => {
    expect(converted('ISO 18265', 'HV', 280, ['HRB', 'HRC']).values.map((value) => value.informative)).toEqual([true, false])
    expect(converted('ISO 18265', 'HV', 252, ['HRB']).values[0]?.informative).toBe(true)
  })
  it.each([['HV', 79, 'HBW'], ['HV', 655, 'HBW'], ['HV', 252, 'HRF'], ['HV', 239, 'HRC'], ['HV', 941, 'HRC'], ['HV', 300, 'HRB'], ['HV', 300, 'HK'], ['HRC', 20, 'HV']])('A.1 has no answer for %s %d in %s', (scale, value, to) => {
    expect(convert('ISO 18265', scale, value, [to])).toMatchObject({ error: { code: 'outside-range' } })
  })
  it('disagrees with ASTM E140 where the standards do', () => {
    // 240 HV is 100 HRB in E140 and 98.1 HRB in ISO 18265
    expect(converted('ASTM E140', 'HV', 240, ['HRB']).values[0]?.value).toBe(100)
    expect(converted('ISO 18265', 'HV', 240, ['HRB']).values[0]?.value).toBe(98.1)
  })
})

function convert(table: string, scale: string, value: number, to: string[]) {
  return evaluate({ tool: 'convert-hardness', material: 'non-austenitic steel', table, from: { scale, value }, to })
}
function converted(table: string, scale: string, value: number, to: string[]): Converted {
  const answer = convert(table, scale, value, to)
  expect(answer).not.toHaveProperty('error')
  return answer as unknown as Converted
}
