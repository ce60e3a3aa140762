import { describe, expect, it } from 'vitest'
import type { Order } from '../../../shared/api/orders.ts'
import { draftOf, orderOf } from '../../../src/components/jobs/draft/draft-state.ts'
import { pastedWords, pasteTable } from '../../../src/components/jobs/draft/paste-table.ts'

const empty: Order = {
  purchaseOrder: '', neededBy: null, afterwards: 'return at once', siteId: null, samples: [],
  columns: [{ key: 't1', methodId: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, requirement: null }],
}
const start = { row: 0, cell: 0 }

describe('rows pasted from a spreadsheet', () => {
  it('are recognised by their headings, in whatever order the columns come', () => {
    const pasted = pasteTable(draftOf(empty), [['Grade', 'dia', 'Heat no', 'Remark', 'Form'], ['42CrMo4 +QT', '60', '7K4192', 'urgent', 'Bar'], ['C45', '0,8', '7K4193', '', 'sheet']], start)
    expect(pasted.count).toBe(2)
    expect(orderOf(pasted.state).samples.map(({ heat, material, piece }) => ({ heat, material, piece }))).toEqual([
      { heat: '7K4192', material: '42CrMo4 +QT', piece: { form: 'bar', diameterMm: 60 } },
      { heat: '7K4193', material: 'C45', piece: { form: 'sheet', thicknessMm: 0.8 } },
    ])
    expect(pastedWords(pasted)).toBe('Material, size, heat and form were recognised by their headings. Left out: Remark.')
  })

  it('are taken in the order of the grid when they have no headings', () => {
    const { state } = pasteTable(draftOf(empty), [['7K4192', 'B-204', '42CrMo4', 'bar', '60'], ['7K4192', 'B-205', '42CrMo4', 'bar', '45 x 90']], start)
    expect(orderOf(state).samples.map(({ lot, piece }) => [lot, piece])).toEqual([['B-204', { form: 'bar', diameterMm: 60 }], ['B-205', { form: 'bar', thicknessMm: 45, widthMm: 90 }]])
  })

  it('fill the cells from where the cursor stands', () => {
    const first = pasteTable(draftOf(empty), [['H1', 'L1', 'C45', 'bar', '20'], ['H2', 'L2', 'C45', 'bar', '20']], start).state
    const { state } = pasteTable(first, [['X1'], ['X2'], ['X3']], { row: 1, cell: 1 })
    expect(orderOf(state).samples.map(({ heat, lot, material }) => [heat, lot, material])).toEqual([['H1', 'L1', 'C45'], ['H2', 'X1', 'C45'], ['', 'X2', 'C45'], ['', 'X3', 'C45']])
  })

  it('name each cell that cannot be read, and keep its text', () => {
    const { state, bad } = pasteTable(draftOf(empty), [['Heat', 'Form', 'Size'], ['H1', 'blob', '60'], ['H2', 'bar', 'big']], start)
    expect(bad.map(({ row }) => row)).toEqual([1, 2])
    expect(bad[0]?.message).toContain('“blob” is no form')
    expect(bad[1]?.message).toContain('“big” is no size in mm')
    expect(state.rows.map(({ unread }) => unread)).toEqual([{ form: 'blob' }, { size: 'big' }])
    expect(orderOf(state).samples.map(({ piece }) => piece)).toEqual([{ form: 'bar' }, { form: 'bar' }])
  })

  it('tick the tests whose column is pasted with them', () => {
    const { state } = pasteTable(draftOf(empty), [['Heat', 'Rockwell HRC'], ['H1', 'x'], ['H2', ''], ['H3', 'no']], start)
    expect(orderOf(state).samples.map(({ tests }) => tests)).toEqual([['t1'], [], []])
  })

  it('stop at the most that an order holds, and say so', () => {
    const { count, bad } = pasteTable(draftOf(empty), Array.from({ length: 503 }, (_, at) => [`H${at}`, 'L']), start)
    expect(count).toBe(500)
    expect(bad.at(-1)?.message).toBe('an order holds 500 samples; 3 rows were left out')
  })
})
