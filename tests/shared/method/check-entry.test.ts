import { describe, expect, it } from 'vitest'
import { checkEntry } from '../../../shared/method/check-entry.ts'
import { inputOf } from '../../../shared/method/entries.ts'
import { methodOf, methods } from '../../../shared/methods.ts'

const rockwell = methodOf('rockwell')!
const tensile = methodOf('tensile')!

describe('a row of a set', () => {
  it.each(['readings.0', 'readings.7', 'readings.9999'])('is taken at %s', (path) => {
    expect(checkEntry(rockwell, path, { value: 31.2 })).toBeNull()
  })
  it.each(['readings.10000', 'readings.123456', 'readings.00', 'readings.01', 'readings.-1', 'readings.1e2', 'readings.x', 'readings.length', 'readings.__proto__'])('is not taken at %s, so that no row has two names', (path) => {
    expect(checkEntry(rockwell, path, { value: 31.2 })).toBe('rows are numbered from 0 to 9999')
  })
  it('is checked by the method\'s own schema and names the field', () => {
    expect(checkEntry(rockwell, 'readings.0', { value: 131 })).toMatch(/^value: .*130/)
    expect(checkEntry(rockwell, 'readings.0', { value: 31, note: 'x' })).toMatch(/note/)
    expect(checkEntry(rockwell, 'readings.0', {})).toMatch(/^value: /)
    for (const value of [null, 31, 'x', [], [{ value: 31 }]]) expect(checkEntry(rockwell, 'readings.0', value)).toEqual(expect.any(String))
  })
  it('tells every fault of a row at once', () => {
    expect(checkEntry(rockwell, 'readings.0', { value: -1, edgeMm: -1 })).toMatch(/^value: .*; edgeMm: /)
  })
})

describe('a named reading', () => {
  it('is taken by its name and checked', () => {
    expect(checkEntry(tensile, 'readings.maximumForceN', 52_000)).toBeNull()
    expect(checkEntry(tensile, 'readings.maximumForceN', -1)).toEqual(expect.any(String))
    expect(checkEntry(tensile, 'readings.curve', { extensionMm: [0, 1, 2, 3], forceN: [0, 1, 2] })).toMatch(/^extensionMm: has 4 points, but the force has 3/)
  })
  it.each(['constructor', 'toString', '__proto__', 'hasOwnProperty', 'nothing', '0'])('is not known by the name %s', (name) => {
    expect(checkEntry(tensile, `readings.${name}`, 1)).toBe('is not known here')
  })
})

describe('a parameter', () => {
  it('is kept at the bench only where the method measures it there', () => {
    expect(checkEntry(tensile, 'parameters.originalGaugeLengthMm', 50)).toBeNull()
    expect(checkEntry(tensile, 'parameters.originalGaugeLengthMm', 0)).toEqual(expect.any(String))
    for (const path of ['parameters.standard', 'parameters.constructor', 'parameters.offsetPercent']) expect(checkEntry(tensile, path, 0.1)).toBe('is ordered by the customer and cannot be changed at the bench')
    expect(checkEntry(rockwell, 'parameters.scale', 'HRBW')).toBe('is ordered by the customer and cannot be changed at the bench')
  })
  it('of every method that is measured at the bench has a schema to check it by', () => {
    for (const method of methods) for (const key of method.measured) expect(checkEntry(method, `parameters.${key}`, Symbol('no value')), `${method.id} ${key}`).not.toBe('is not known here')
  })
})

it.each(['', 'readings', 'readings.', 'results.0', 'readings.0.value', 'parameters'])('%j is no place for a reading', (path) => {
  expect(checkEntry(rockwell, path, { value: 31 })).toBe('is not a place for a reading')
})

it('an entry that was taken is one that the engine reads', () => {
  const live = [31.2, 31.6, 31.4].map((value, at) => ({ path: `readings.${at}`, value: { value } }))
  expect(live.map(({ path, value }) => checkEntry(rockwell, path, value))).toEqual([null, null, null])
  const { results } = rockwell.evaluate(inputOf({ standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, live, rockwell.isSet))
  expect(results[0]?.value).toBeCloseTo(31.4, 10)
})
