import type { Result } from '../../method/method.ts'
import type { Conversion } from '../../method/picture.ts'
import { conversionScales, type ConversionScale } from '../conversion/conversion-scale.ts'
import { convertByTable } from '../conversion/convert-by-table.ts'
import type { RockwellParameters } from './rockwell-input.ts'
import type { RockwellScale } from './rockwell-scale.ts'

/** What a reader asks for beside a Rockwell number. */
const wanted: readonly ConversionScale[] = ['HV', 'HBW', 'HRC', 'HRB', 'tensileStrengthMPa']

/** The mean by the table that goes with the standard, where it has an answer; nothing for scales that no table knows. */
export function rockwellConversions({ standard, scale }: Pick<RockwellParameters, 'standard' | 'scale'>, results: readonly Result[]): Conversion[] {
  const from = tableScale(scale)
  const mean = results.find((result) => result.key === 'mean')
  if (!from || !mean) return []
  const name = standard === 'ASTM E18' ? 'ASTM E140' : 'ISO 18265'
  const values = wanted.filter((to) => to !== from).flatMap((to) => convertByTable(name, { scale: from, value: mean.value }, to) ?? [])
  if (values.length === 0) return []
  return [{
    table: name === 'ASTM E140' ? 'ASTM E140-12b Tables 1 and 2, ASTM A370' : 'ISO 18265:2013 Table A.1',
    caution: 'Approximate, for non-austenitic steel only; not for acceptance unless the requirement says so.',
    values: values.map(({ scale: to, reported, informative }) => ({ scale: to, reported, informative })),
  }]
}

/** HRBW is the HRB of the tables: their ball scales do not name the ball's material. */
function tableScale(scale: RockwellScale): ConversionScale | undefined {
  const name = scale.replace(/W$/, '')
  return conversionScales.find((one) => one === name)
}
