import { cleanup, render, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { MemoryRouter, useLocation } from 'react-router-dom'
import { afterEach, describe, expect, it } from 'vitest'
import type { Column } from '../../../src/components/ui/table/column.ts'
import { csvCell, csvText } from '../../../src/components/ui/table/csv.ts'
import { DataTable } from '../../../src/components/ui/table/data-table.tsx'

type Row = { id: string; heat: string; due: string | null; price: number }
const rows: Row[] = [
  { id: 'a', heat: '7K4192', due: '2026-03-13', price: 957.6 },
  { id: 'b', heat: '7K4193', due: null, price: 1296 },
  { id: 'c', heat: '=D22071', due: '2026-03-10', price: 96 },
]
const columns: Column<Row>[] = [
  { id: 'heat', head: 'Heat', cell: (row) => row.heat, value: (row) => row.heat, filter: { kind: 'text', words: 'heat' } },
  { id: 'due', head: 'Due', cell: (row) => row.due ?? 'no date', value: (row) => row.due },
  { id: 'price', head: 'Price', unit: '£', numeric: true, sort: 'down', cell: (row) => row.price.toFixed(2), value: (row) => row.price, filter: { kind: 'choice', all: 'any', choices: [{ value: 'over', label: 'over 1000' }], of: (row) => (row.price > 1000 ? 'over' : 'under') } },
]
function Address() {
  return <output>{useLocation().search}</output>
}
function table(at: string, data = rows) {
  render(<MemoryRouter initialEntries={[at]}><DataTable caption="Samples" columns={columns} rows={data} rowId={(row) => row.id} empty={{ title: 'No samples yet' }} /><Address /></MemoryRouter>)
}
const shown = () => within(screen.getByRole('table')).getAllByRole('row').slice(1).map((row) => within(row).getAllByRole('cell')[0]?.textContent)
const address = () => screen.getByText((_, element) => element?.tagName === 'OUTPUT').textContent

afterEach(cleanup)

describe('a table', () => {
  it('sorts by its head, keeps that in the address, and takes it away again', async () => {
    table('/samples?page=2')
    const price = screen.getByRole('button', { name: /Price/ })
    await userEvent.click(price)
    expect(shown()).toEqual(['7K4193', '7K4192', '=D22071'])
    expect(address()).toBe('?page=2&sort=-price')
    expect(screen.getByRole('columnheader', { name: /Price/ }).getAttribute('aria-sort')).toBe('descending')
    await userEvent.click(price)
    expect(shown()).toEqual(['=D22071', '7K4192', '7K4193'])
    await userEvent.click(price)
    expect(address()).toBe('?page=2')
  })

  it('opens the same view from a link, with missing values last both ways', () => {
    table('/samples?sort=due')
    expect(shown()).toEqual(['=D22071', '7K4192', '7K4193'])
    cleanup()
    table('/samples?sort=-due')
    expect(shown()).toEqual(['7K4192', '=D22071', '7K4193'])
  })

  it('filters by words and by choice, in the address', async () => {
    table('/samples')
    await userEvent.type(screen.getAllByRole('searchbox', { name: 'Filter by heat' })[0] ?? document.body, '7k4')
    await waitFor(() => expect(address()).toBe('?heat=7k4'))
    expect(shown()).toEqual(['7K4192', '7K4193'])
    await userEvent.selectOptions(screen.getAllByRole('combobox', { name: 'Filter by price, £' })[0] ?? document.body, 'over')
    expect(shown()).toEqual(['7K4193'])
  })

  it('says what to do when there is nothing, and when a filter leaves nothing', async () => {
    table('/samples', [])
    expect(screen.getByText('No samples yet')).toBeTruthy()
    cleanup()
    table('/samples?heat=none')
    await userEvent.click(screen.getByRole('button', { name: 'Take the filters away' }))
    expect(shown()).toHaveLength(3)
  })

  it('selects many', async () => {
    function Selecting() {
      const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set())
      return <DataTable caption="Samples" columns={columns} rows={rows} rowId={(row) => row.id} selection={{ chosen, onChange: setChosen, rowName: (row) => row.heat }} />
    }
    render(<MemoryRouter><Selecting /></MemoryRouter>)
    await userEvent.click(screen.getByRole('checkbox', { name: 'Choose 7K4193' }))
    expect(screen.getByText('1 chosen')).toBeTruthy()
    expect(screen.getByRole<HTMLInputElement>('checkbox', { name: 'Choose all rows' }).indeterminate).toBe(true)
    await userEvent.click(screen.getByRole('checkbox', { name: 'Choose all rows' }))
    expect(screen.getByText('3 chosen')).toBeTruthy()
  })
})

describe('a table as a file', () => {
  it('quotes what needs it and lets no cell run as a formula', () => {
    expect(csvText(columns, rows)).toBe('Heat,Due,"Price, £"\r\n7K4192,2026-03-13,957.6\r\n7K4193,,1296\r\n\'=D22071,2026-03-10,96\r\n')
    expect(['+1', '-1', '@a', '\ta', 'a"b'].map(csvCell)).toEqual(["'+1", "'-1", "'@a", "'\ta", '"a""b"'])
    expect(csvCell(-1)).toBe('-1')
  })
})
