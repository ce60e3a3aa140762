import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { inputOf, splitPath } from '../../../shared/method/entries.ts'

describe('entries kept at the bench', () => {
  it('closes up rows in the order of their numbers', () => {
    const live = [{ path: 'readings.10', value: 'c' }, { path: 'readings.2', value: 'b' }, { path: 'readings.0', value: 'a' }]
    expect(inputOf({}, live, true)).toEqual({ parameters: {}, readings: ['a', 'b', 'c'] })
  })
  it('does not mind in which order rows were kept', () => {
    fc.assert(fc.property(fc.shuffledSubarray([0, 1, 2, 5, 9, 10, 11, 100], { minLength: 1 }), (order) => {
      const { readings } = inputOf({}, order.map((at) => ({ path: `readings.${at}`, value: at })), true)
      expect(readings).toEqual([...order].sort((a, b) => a - b))
    }))
  })
  it('puts named readings and measured parameters in their places and leaves the order as it was', () => {
    const ordered = { standard: 'x', offsetPercent: 0.2 }
    const live = [{ path: 'readings.curve', value: 1 }, { path: 'parameters.section', value: 2 }, { path: 'parameters.offsetPercent', value: 0.1 }]
    expect(inputOf(ordered, live, false)).toEqual({ parameters: { standard: 'x', offsetPercent: 0.1, section: 2 }, readings: { curve: 1 } })
    expect(ordered).toEqual({ standard: 'x', offsetPercent: 0.2 })
  })
  it.each(['readings', 'readings.', 'results.0', 'readings.0.value', ''])('knows no place %j', (path) => {
    expect(() => splitPath(path)).toThrow(RangeError)
  })
})
