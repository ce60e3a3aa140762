import { cleanup, render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { MemoryRouter } from 'react-router-dom'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { rockwell } from '../../../shared/hardness/rockwell.ts'
import { counting, type SheetReading } from '../../../src/lib/kept-readings/sheet-readings.ts'
import { evaluateLive } from '../../../src/methods/evaluate-live.ts'
import { pendingEntries } from '../../../src/methods/pending-entries.ts'
import { RockwellView } from '../../../src/methods/rockwell/rockwell-view.tsx'
import { aRun } from '../bench/a-run.ts'

const run = aRun({ requirement: { limits: [{ key: 'mean', lower: 29, upper: 34 }], rule: 'simple' } })

/** The sheet with its readings in memory, as the bench holds them. */
function Sheet({ first = [], onStrike = () => undefined, locked = '' }: { first?: SheetReading[]; onStrike?: (key: string) => void; locked?: string }) {
  const [readings, setReadings] = useState(first)
  const [typed, setTyped] = useState<Record<string, string>>({})
  const live = evaluateLive(rockwell, run, [...counting(readings), ...pendingEntries(rockwell, typed, readings)])
  const settle = { keepAs: vi.fn(), drop: vi.fn(), useMine: vi.fn() }
  return (
    <MemoryRouter>
      <RockwellView
        method={rockwell} run={run} readings={readings} live={live} typed={typed} type={(change) => setTyped((now) => ({ ...now, ...change }))} locked={locked} settle={settle} replace={vi.fn()} addRecord={() => Promise.resolve()} without={() => undefined}
        keep={(entries) => setReadings((now) => [...now, ...entries.map(({ path, value }) => reading(path, value))])} strike={onStrike}
      />
    </MemoryRouter>
  )
}
const reading = (path: string, value: unknown, change: Partial<SheetReading> = {}): SheetReading => ({ key: `key of ${path}`, path, value, at: '2026-03-10T10:00:00.000Z', struck: null, where: 'server', clash: false, refused: undefined, ...change })
const row = (name: string) => screen.getByRole('rowheader', { name }).closest('tr')!

afterEach(cleanup)

describe('the hardness sheet', () => {
  it('keeps a reading with digits and Enter alone and goes on to the next', async () => {
    const user = userEvent.setup()
    render(<Sheet />)
    await user.keyboard('31.2{Enter}31.6{Enter}31.4{Enter}')
    expect(within(row('3')).getByText('31.4')).toBeTruthy()
    expect(document.activeElement).toBe(screen.getByRole('textbox', { name: 'Reading 4, reading' }))
    expect(screen.getByRole('button', { name: 'HRC 31.4 HRC: where this number comes from' })).toBeTruthy()
    expect(screen.getByText('Would meet 29.0 to 34.0 HRC')).toBeTruthy()
  })

  it('counts the row that is typed before it is kept', async () => {
    const user = userEvent.setup()
    render(<Sheet first={[reading('readings.0', { value: 31 }), reading('readings.1', { value: 31 })]} />)
    await user.keyboard('34')
    expect(screen.getByText('Mean of 3 readings, one not kept yet')).toBeTruthy()
    expect(screen.getByText('32.0')).toBeTruthy()
  })

  it('says a broken rule in its row and with its cure', () => {
    render(<Sheet first={[reading('readings.0', { value: 31.4, xMm: 10, yMm: 6 }), reading('readings.1', { value: 31.9, xMm: 11.1, yMm: 6 })]} />)
    expect(within(row('2')).getByText('1.10 mm from reading 1')).toBeTruthy()
    const note = within(screen.getByRole('alert'))
    expect(note.getByText('Reading 2 lies 1.10 mm from reading 1.')).toBeTruthy()
    expect(note.getByRole('button', { name: /Strike out reading 2/ })).toBeTruthy()
  })

  it('never takes a letter as input: S strikes out the reading that breaks a rule', async () => {
    // as a hand types: a letter that follows sooner than 50 ms belongs to a scanner's burst
    const user = userEvent.setup({ delay: 90 })
    const onStrike = vi.fn()
    render(<Sheet onStrike={onStrike} first={[reading('readings.0', { value: 31.4, xMm: 10 }), reading('readings.1', { value: 31.9, xMm: 11.1 }), reading('readings.2', { value: 31.5, xMm: 16 })]} />)
    await user.keyboard('3s')
    await vi.waitFor(() => expect(onStrike).toHaveBeenCalledWith('key of readings.1'))
    expect(screen.getByRole('textbox', { name: 'Reading 4, reading' })).toHaveProperty('value', '3')
  })

  it('goes through the rows with the arrows and strikes out the one it stands on', async () => {
    const user = userEvent.setup()
    const onStrike = vi.fn()
    render(<Sheet onStrike={onStrike} first={[reading('readings.0', { value: 31.4 }), reading('readings.1', { value: 31.9 })]} />)
    await user.keyboard('{ArrowUp}{ArrowUp}s')
    await vi.waitFor(() => expect(onStrike.mock.calls[0]?.[0]).toBe('key of readings.0'))
  })

  it('offers the place of a struck row again and shows its reason', () => {
    render(<Sheet first={[reading('readings.0', { value: 31.4 }), reading('readings.1', { value: 13.9 }, { struck: { reason: 'typed wrong' } })]} />)
    expect(screen.getByText('struck out: typed wrong')).toBeTruthy()
    expect(screen.getByRole('textbox', { name: 'Reading 2, reading' })).toBeTruthy()
  })

  it('shows both rows that want one place and lets one choose', () => {
    render(<Sheet first={[reading('readings.0', { value: 30.9 }), reading('readings.0', { value: 31.2 }, { key: 'mine', where: 'device', clash: true })]} />)
    expect(screen.getByText('30.9', { selector: 'td' })).toBeTruthy()
    expect(screen.getByText('31.2', { selector: 'td' })).toBeTruthy()
    expect(screen.getByRole('button', { name: 'Keep it as reading 2' })).toBeTruthy()
  })

  it('takes nothing more once the run is over', () => {
    render(<Sheet locked="This run is recorded." first={[reading('readings.0', { value: 31.4 })]} />)
    expect(screen.queryByRole('textbox')).toBeNull()
    expect(screen.queryByRole('button', { name: /Strike out/ })).toBeNull()
  })
})
