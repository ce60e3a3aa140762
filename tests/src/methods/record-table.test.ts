import { readFileSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { loadExtensionRecord } from '../../../shared/tensile/record.ts'
import { guessColumns } from '../../../src/methods/tensile/record/guess-columns.ts'
import { findManner, readRows, tableOf } from '../../../src/methods/tensile/record/read-table.ts'

async function found(text: string) {
  const manner = await findManner(text)
  const table = tableOf(await readRows(text, manner.delimiter), manner.headingRows)
  return { manner, table, columns: guessColumns(table) }
}

describe('the record of a test frame', () => {
  it('is found as it comes from a frame with points and commas', async () => {
    const { manner, table, columns } = await found(readFileSync('tests/standards/records/42CrMoS4/46NT99.csv', 'utf8'))
    expect(manner).toEqual({ delimiter: ',', headingRows: 1, decimal: '.' })
    expect(columns).toEqual({ extension: { column: 'extension_mm', unit: 'mm' }, force: { column: 'force_N', unit: 'N' }, time: { column: 'time_s', unit: 's' } })
    const { forceN, extensionMm } = loadExtensionRecord(table, { ...columns, decimal: '.' })
    expect([forceN[0], extensionMm[0]]).toEqual([74.97, 0.0004538])
  })

  it('is found with decimal commas, semicolons, and a heading of names and units', async () => {
    const text = 'Prüfung;12\r\nDatum;10.03.2026\r\nZeit;Kraft;Dehnung\r\ns;kN;mm\r\n0,0;0,10;0,0012\r\n0,1;0,35;0,0023\r\n0,2;0,61;0,0031\r\n0,3;0,88;0,0044\r\n'
    const { manner, table, columns } = await found(text)
    expect(manner).toEqual({ delimiter: ';', headingRows: 4, decimal: ',' })
    expect(columns).toEqual({ extension: { column: 'Dehnung mm', unit: 'mm' }, force: { column: 'Kraft kN', unit: 'kN' }, time: { column: 'Zeit s', unit: 's' } })
    expect(loadExtensionRecord(table, { ...columns, decimal: ',' }).forceN.map(Math.round)).toEqual([100, 350, 610, 880])
  })

  it('is found with tabs and a strain in percent', async () => {
    const { manner, columns } = await found('Strain [%]\tForce [kN]\n0.01\t1.0\n0.02\t2.0\n0.03\t3.0\n')
    expect(manner).toEqual({ delimiter: '\t', headingRows: 1, decimal: '.' })
    expect(columns).toEqual({ extension: { column: 'Strain [%]', unit: '% of gauge length' }, force: { column: 'Force [kN]', unit: 'kN' } })
  })

  it('gives columns without a name, or with the same name, names of their own', () => {
    expect(tableOf([['Force', 'Force', ''], ['1', '2', '3']], 1).names).toEqual(['Force', 'Force (2)', 'column 3'])
  })
})
