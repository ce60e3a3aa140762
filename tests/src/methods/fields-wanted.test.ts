import { describe, expect, it } from 'vitest'
import { fieldsWanted } from '../../../src/methods/grain/fields-wanted.ts'

describe('how many fields are wanted', () => {
  // by hand with printed t values: n = 5 gives 2.776 · 5 / √5 = 6.21, n = 6 gives 2.571 · 5 / √6 = 5.25, allowed are 5.5
  it('is the least number that brings the interval down', () => expect(fieldsWanted([50, 60, 55], 10)).toBe(6))
  it('is what there is when that is enough', () => expect(fieldsWanted([55, 55.2, 54.9], 10)).toBe(3))
  it('is unknown from one field, and beyond reason', () => expect([fieldsWanted([50], 10), fieldsWanted([1, 100], 1)]).toEqual([undefined, undefined]))
})
