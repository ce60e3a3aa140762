import { QueryClient, QueryClientProvider } from '@tanstack/react-query'
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { afterEach, describe, expect, it } from 'vitest'
import type { Order } from '../../../shared/api/orders.ts'
import { orderFaults } from '../../../shared/orders/order-faults.ts'
import { SampleGrid } from '../../../src/components/jobs/grid/sample-grid.tsx'
import { draftOf, orderOf } from '../../../src/components/jobs/draft/draft-state.ts'
import { began, changed, redone, undone } from '../../../src/components/jobs/draft/history.ts'

afterEach(cleanup)

const rockwell = { key: 't1', methodId: 'rockwell', parameters: { standard: 'ASTM E18', scale: 'HRC', surface: { shape: 'flat' } }, requirement: null }
const sample = (heat: string, piece: Order['samples'][number]['piece'] = { form: 'bar', diameterMm: 60 }) => ({ heat, lot: 'B-1', material: 'C45', piece, tests: ['t1'], overrides: {} })
const order = (samples: Order['samples']): Order => ({ purchaseOrder: '', neededBy: null, afterwards: 'return at once', siteId: null, columns: [rockwell], samples })

let now: Order
function Grid({ first }: { first: Order }) {
  const [history, setHistory] = useState(() => began(draftOf(first)))
  now = orderOf(history.now)
  return (
    <SampleGrid
      faults={orderFaults(now)} rowMinor={[]} netMinor={0} currency="GBP"
      draft={{
        state: history.now, change: (next, mark = null) => setHistory((old) => changed(old, next(old.now), mark)), undo: () => setHistory(undone), redo: () => setHistory(redone), mayUndo: true,
        saving: { busy: false, unsaved: false, savedAt: null, trouble: null }, conflict: false, keepMine: () => undefined, takeTheirs: () => undefined, save: () => Promise.resolve(0),
      }}
    />
  )
}
const show = (samples: Order['samples']) => render(<QueryClientProvider client={new QueryClient()}><Grid first={order(samples)} /></QueryClientProvider>)
const heats = () => now.samples.map(({ heat }) => heat)

describe('the grid of samples', () => {
  it('begins a sample when the row below the last is typed in, like the one above it, and keeps the cursor', async () => {
    show([sample('H1')])
    await userEvent.type(screen.getByLabelText('heat, new row'), 'H2')
    expect(now.samples[1]).toMatchObject({ heat: 'H2', lot: '', material: 'C45', piece: { form: 'bar', diameterMm: 60 }, tests: ['t1'] })
    expect(document.activeElement).toBe(screen.getByLabelText('heat, row 2'))
  })

  it('goes between cells by keyboard, fills down and takes it back', async () => {
    show([sample('H1'), sample('H2'), sample('H3')])
    await userEvent.click(screen.getByLabelText('heat, row 1'))
    await userEvent.keyboard('{Shift>}{ArrowDown}{ArrowDown}{/Shift}{Control>}d{/Control}')
    expect(heats()).toEqual(['H1', 'H1', 'H1'])
    await userEvent.keyboard('{Control>}z{/Control}')
    expect(heats()).toEqual(['H1', 'H2', 'H3'])
    await userEvent.keyboard('{Enter}')
    expect(document.activeElement).toBe(screen.getByLabelText('heat, new row'))
  })

  it('takes back a word typed in one cell as one step', async () => {
    show([sample('H1')])
    await userEvent.type(screen.getByLabelText('material, row 1'), ' +QT')
    expect(now.samples[0]?.material).toBe('C45 +QT')
    await userEvent.keyboard('{Control>}z{/Control}')
    expect(now.samples[0]?.material).toBe('C45')
  })

  it('ticks by Space, and all rows from the head', async () => {
    show([sample('H1'), sample('H2')])
    screen.getByRole('checkbox', { name: 'Rockwell HRC, row 1' }).focus()
    await userEvent.keyboard(' ')
    expect(now.samples.map(({ tests }) => tests)).toEqual([[], ['t1']])
    await userEvent.click(screen.getByRole('checkbox', { name: 'Rockwell HRC, all rows' }))
    expect(now.samples.map(({ tests }) => tests)).toEqual([['t1'], ['t1']])
  })

  it('says what a method cannot take, and cures it for that row alone', async () => {
    show([sample('H1'), sample('H2', { form: 'sheet', thicknessMm: 0.8 })])
    const [note] = screen.getAllByRole('alert')
    expect(note?.textContent).toContain('0.8 mm is too thin for HRC')
    const [cure] = within(note!).getAllByRole('button', { name: /this row only/ })
    await userEvent.click(cure!)
    expect(Object.keys(now.samples[1]?.overrides['t1'] ?? {})).toEqual(['scale'])
    expect(now.columns[0]?.parameters).toEqual(rockwell.parameters)
    expect(screen.queryByRole('alert')).toBeNull()
  })

  it('takes pasted rows, says so, and takes them back', async () => {
    show([])
    fireEvent.paste(screen.getByLabelText('heat, new row'), { clipboardData: { getData: () => 'Heat\tLot\tMaterial\tSize\r\nH1\tL1\tC45\t60\r\nH2\tL2\tC45\tbig\r\n' } })
    expect(await screen.findByText('2 rows pasted.')).toBeTruthy()
    expect(heats()).toEqual(['H1', 'H2'])
    expect(screen.getByText(/^Row 2, size: “big” is no size/)).toBeTruthy()
    await userEvent.click(screen.getByRole('button', { name: 'Undo' }))
    expect(heats()).toEqual([])
  })

  it('copies and deletes a row', async () => {
    show([sample('H1'), sample('H2')])
    await userEvent.click(screen.getByRole('button', { name: 'Row 1: copy or delete' }))
    await userEvent.click(screen.getByRole('menuitem', { name: 'Copy this row below' }))
    expect(heats()).toEqual(['H1', 'H1', 'H2'])
    await userEvent.click(screen.getByRole('button', { name: 'Row 3: copy or delete' }))
    await userEvent.click(screen.getByRole('menuitem', { name: 'Delete this row' }))
    expect(heats()).toEqual(['H1', 'H1'])
  })
})
