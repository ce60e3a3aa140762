import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { MemoryRouter } from 'react-router-dom'
import { afterEach, describe, expect, it } from 'vitest'
import type { StepInSample } from '../../../shared/api/samples.ts'
import { SampleSteps } from '../../../src/components/samples/sample-steps.tsx'

afterEach(cleanup)

const step = (change: Partial<StepInSample>): StepInSample => ({
  id: '01a23210-0000-7000-8000-000000000001', position: 1, label: 'pull', kind: 'pull', capability: 'tensile', testId: null, state: 'planned', benchId: '01a23210-0000-7000-8000-000000000002',
  benchName: 'Frame 100 kN', personName: null, plannedStart: '2026-03-10T11:05:00Z', plannedEnd: '2026-03-10T11:35:00Z', startedAt: null, endedAt: null, why: 'the first frame that is free', rejected: [], unplacedBecause: null, ...change,
})
const show = (steps: StepInSample[], mayOpenBench = true) => render(<MemoryRouter><SampleSteps steps={steps} zone="Europe/London" mayOpenBench={mayOpenBench} /></MemoryRouter>)

describe('the steps of a sample', () => {
  it('say why there and then, and on being asked what was ruled out', async () => {
    show([step({ rejected: [{ bench: 'Frame 600 kN', because: 'its verification ended' }] })])
    expect(screen.getByText('the first frame that is free')).toBeTruthy()
    expect(screen.queryByText('its verification ended')).toBeNull()
    await userEvent.click(screen.getByRole('button', { name: 'What was ruled out for pull' }))
    expect(screen.getByRole('listitem').textContent).toBe('Frame 600 kN: its verification ended')
  })

  it('say why a step has no place yet', () => {
    show([step({ benchId: null, benchName: null, plannedStart: null, plannedEnd: null, why: '', unplacedBecause: 'no frame here pulls 400 kN' })])
    expect(screen.getByText('no frame here pulls 400 kN')).toBeTruthy()
    expect(screen.getByText('not planned')).toBeTruthy()
  })

  it('lead to the bench those who work there', () => {
    show([step({})])
    expect(screen.getByRole('link', { name: 'Frame 100 kN' }).getAttribute('href')).toBe('/bench/01a23210-0000-7000-8000-000000000002')
    cleanup()
    show([step({})], false)
    expect(screen.queryByRole('link')).toBeNull()
  })
})
