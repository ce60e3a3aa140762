import { describe, expect, it } from 'vitest'
import { dayRange, dayWords, timeWords } from '../../../shared/reports/words/day-words.ts'
import { numberIn, unitIn } from '../../../shared/reports/words/number-in.ts'
import { sampleList } from '../../../shared/reports/words/sample-list.ts'
import { symbolParts } from '../../../shared/reports/words/symbol-parts.ts'

describe('days', () => {
  it('are those of the site\'s clocks', () => {
    expect(dayWords('2026-03-02T23:30:00Z', 'Europe/London')).toBe('2 Mar 2026')
    expect(dayWords('2026-03-02T23:30:00Z', 'Europe/Berlin')).toBe('3 Mar 2026')
    expect(dayWords('2026-09-01T12:00:00Z', 'UTC')).toBe('1 Sep 2026')
  })

  it('stand together as a stretch that repeats nothing', () => {
    const range = (from: string, to: string) => dayRange({ from: `${from}T12:00:00Z`, to: `${to}T12:00:00Z` }, 'UTC')
    expect(range('2026-03-09', '2026-03-11')).toBe('9 to 11 Mar 2026')
    expect(range('2026-03-30', '2026-04-02')).toBe('30 Mar to 2 Apr 2026')
    expect(range('2025-12-30', '2026-01-02')).toBe('30 Dec 2025 to 2 Jan 2026')
    expect(range('2026-03-09', '2026-03-09')).toBe('9 Mar 2026')
  })

  it('have times with their offset', () => {
    expect(timeWords('2026-03-13T15:52:00Z', 'Europe/London')).toBe('13 Mar 2026, 15:52 UTC')
    expect(timeWords('2026-07-13T00:05:00Z', 'Europe/London')).toBe('13 Jul 2026, 01:05 UTC+1')
  })
})

it('finds the number and the unit in what was reported', () => {
  const cases = [['31.3 HRC', '31.3', 'HRC'], ['G 8.5', '8.5', 'G'], ['640 HV 10', '640', 'HV 10'], ['± 0.24', '0.24', '±'], ['0.943', '0.943', ''], ['-0.5 %', '-0.5', '%']] as const
  for (const [reported, number, unit] of cases) expect([numberIn(reported), unitIn(reported)]).toEqual([number, unit])
})

it('names samples in few words', () => {
  const list = (...parts: string[]) => sampleList(parts.map((part) => `J-26-00417-${part}`))
  expect(list('02')).toBe('sample 02')
  expect(list('01', '02')).toBe('samples 01 and 02')
  expect(list('01', '02', '03', '04', '07')).toBe('samples 01 to 04 and 07')
  expect(list('99', '100', '101')).toBe('samples 99 to 101')
})

it('sets the index of a symbol below the line', () => {
  const set = (symbol: string) => symbolParts(symbol).map(({ text, below }) => (below ? `_${text}` : text)).join('')
  expect(['Rp0.2', 'Rm', 'ReH', 'Agt', 'A', 'Z', 'HRC', 'G', 'S0', 'N_L', 'Rp0.2/Rm'].map(set)).toEqual(['R_p0.2', 'R_m', 'R_eH', 'A_gt', 'A', 'Z', 'HRC', 'G', 'S_0', 'N_L', 'R_p0.2/R_m'])
})
