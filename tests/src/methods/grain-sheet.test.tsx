import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { MemoryRouter } from 'react-router-dom'
import { afterEach, expect, it, vi } from 'vitest'
import { grainIntercept } from '../../../shared/grain/grain-intercept.ts'
import { counting, type SheetReading } from '../../../src/lib/kept-readings/sheet-readings.ts'
import { evaluateLive } from '../../../src/methods/evaluate-live.ts'
import { GrainInterceptView } from '../../../src/methods/grain/grain-intercept-view.tsx'
import { aRun } from '../bench/a-run.ts'

const run = aRun({ methodId: 'grain-intercept', parameters: { standard: 'ASTM E112' } })

function Sheet({ onKeep }: { onKeep: (value: unknown) => void }) {
  const [readings, setReadings] = useState<SheetReading[]>([])
  const [typed, setTyped] = useState<Record<string, string>>({})
  return (
    <MemoryRouter>
      <GrainInterceptView
        method={grainIntercept} run={run} readings={readings} live={evaluateLive(grainIntercept, run, counting(readings))} typed={typed} type={(change) => setTyped((now) => ({ ...now, ...change }))} locked="" settle={{ keepAs: vi.fn(), drop: vi.fn(), useMine: vi.fn() }} replace={vi.fn()} addRecord={() => Promise.resolve()} without={() => undefined} strike={vi.fn()}
        keep={(entries) => { for (const { path, value } of entries) { onKeep(value); setReadings((now) => [...now, { key: path, path, value, at: '2026-03-10T10:00:00.000Z', struck: null, where: 'server', clash: false, refused: undefined }]) } }}
      />
    </MemoryRouter>
  )
}

afterEach(cleanup)

it('takes the line of the field before, so that a count and Enter are enough', async () => {
  const user = userEvent.setup()
  const onKeep = vi.fn()
  render(<Sheet onKeep={onKeep} />)
  await user.keyboard('75{Tab}1.25{Enter}')
  await user.keyboard('72{Enter}')
  await user.keyboard('76{Enter}')
  expect(onKeep.mock.calls.map(([value]) => value as unknown)).toEqual([{ intersections: 75, lineLengthMm: 1.25 }, { intersections: 72, lineLengthMm: 1.25 }, { intersections: 76, lineLengthMm: 1.25 }])
  expect(screen.getByText('Grain size, 3 fields, 223 counts')).toBeTruthy()
})
