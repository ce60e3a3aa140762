import { describe, expect, it } from 'vitest'
import type { SheetReading } from '../../../src/lib/kept-readings/sheet-readings.ts'
import { nextRow, setRows } from '../../../src/methods/set/set-rows.ts'

const row = (index: number, struck = false): SheetReading => ({ key: `k${index}${struck ? 's' : ''}`, path: `readings.${index}`, value: { value: 31 }, at: '2026-03-10T10:00:00.000Z', struck: struck ? { reason: 'typed wrong' } : null, where: 'server', clash: false, refused: undefined })

describe('the rows of a set', () => {
  it('go on after the last one', () => expect(nextRow([row(0), row(1)])).toBe(2))

  it('offer the place of a row that was struck out first', () => expect(nextRow([row(0), row(1, true), row(2)])).toBe(1))

  it('show a struck row where it stood and number the others as the rules count them', () => {
    expect(setRows([row(0), row(1, true), row(2)], false).map(({ reading, number, counts }) => [reading.key, counts ? number : null])).toEqual([['k0', 1], ['k1s', null], ['k2', 2]])
  })

  it('count the row being typed in its place', () => {
    expect(setRows([row(0), row(1, true), row(2)], true).filter(({ counts }) => counts).map(({ number }) => number)).toEqual([1, 3])
  })

  it('leave out what is kept elsewhere, such as parameters', () => expect(setRows([{ ...row(0), path: 'parameters.section' }], false)).toEqual([]))
})
