import { describe, expect, it } from 'vitest'
import { round } from '../../shared/units/round.ts'

/** [source, value, increment, half to even, half away from zero] */
const cases: [string, string, string, string, string][] = [
  ['ISO 80000-1:2009 Annex B, from memory', '12.223', '0.1', '12.2', '12.2'],
  ['ISO 80000-1:2009 Annex B, from memory', '12.275', '0.1', '12.3', '12.3'],
  ['ISO 80000-1:2009 Annex B, from memory', '1222.3', '10', '1220', '1220'],
  ['ISO 80000-1:2009 Annex B, from memory', '1227.5', '10', '1230', '1230'],
  ['ISO 80000-1:2009 Annex B, rules A and B, from memory', '12.25', '0.1', '12.2', '12.3'],
  ['ISO 80000-1:2009 Annex B, rules A and B, from memory', '1225.0', '10', '1220', '1230'],
  ['ISO 80000-1:2009 Annex B, rules A and B, from memory', '1235.0', '10', '1240', '1240'],
  ['ASTM E29-13 table of examples, from memory', '59940', '100', '59900', '59900'],
  ['ASTM E29-13 table of examples, from memory', '59950', '100', '60000', '60000'],
  ['ASTM E29-13 table of examples, from memory', '56.4', '1', '56', '56'],
  ['ASTM E29-13 table of examples, from memory', '56.5', '1', '56', '57'],
  ['ASTM E29-13 table of examples, from memory', '40.4', '1', '40', '40'],
  ['ASTM E29-13 table of examples, from memory', '40.5', '1', '40', '41'],
  ['ASTM E29-13 table of examples, from memory', '0.54', '0.1', '0.5', '0.5'],
  ['ASTM E29-13 table of examples, from memory', '0.55', '0.1', '0.6', '0.6'],
  ['example in the annex of a published fittings standard', '1.655', '0.01', '1.66', '1.66'],
  ['example in the annex of a published fittings standard', '1.625', '0.01', '1.62', '1.63'],
  ['rounding to even in a published data book', '123.55', '0.1', '123.6', '123.6'],
  ['closed form: a tie that binary numbers miss', '2.675', '0.01', '2.68', '2.68'],
  ['closed form: a tie that binary numbers miss', '0.285', '0.01', '0.28', '0.29'],
  ['closed form', '2.5', '1', '2', '3'],
  ['closed form', '-2.5', '1', '-2', '-3'],
  ['closed form', '355.5', '1', '356', '356'],
  ['closed form', '24.75', '0.5', '25.0', '25.0'],
  ['closed form', '1097.5', '5', '1100', '1100'],
  ['closed form', '62.25', '0.5', '62.0', '62.5'],
  ['closed form', '0.0125', '0.005', '0.010', '0.015'],
  ['closed form', '9.995', '0.01', '10.00', '10.00'],
  ['closed form', '1234.5', '1', '1234', '1235'],
]

describe('rounding', () => {
  it.each(cases)('agrees with %s: %s to %s', (_, value, increment, even, up) => {
    expect(round(value, increment, 'half-even')).toBe(even)
    expect(round(value, increment, 'half-up')).toBe(up)
    expect(round(Number(value), increment, 'half-even')).toBe(even)
    expect(round(Number(value), increment, 'half-up')).toBe(up)
  })
})
