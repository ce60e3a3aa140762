import { cleanup, render, screen, within } from '@testing-library/react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { TravellerNode } from '../../../shared/api/basics.ts'
import { TravellerLine } from '../../../src/components/ui/traveller/traveller-line.tsx'
import { travellerSummary } from '../../../src/components/ui/traveller/traveller-summary.ts'
import { travellerTime } from '../../../src/components/ui/traveller/traveller-time.ts'

const node = (label: string, state: TravellerNode['state'], more: Partial<TravellerNode> = {}): TravellerNode => ({ kind: 'prep', stage: 'in work', label, state, ...more })
const line = [
  node('placed', 'done', { kind: 'end', stage: 'placed', at: '2026-03-02T09:00:00Z' }),
  node('section', 'done', { at: '2026-03-06T08:30:00Z', place: 'Cutting 1' }),
  node('pull', 'now', { kind: 'test', at: '2026-03-10T10:31:00Z', place: 'Frame 100 kN' }),
  node('report', 'todo', { kind: 'report', stage: 'reported' }),
]

afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
})

describe('the traveller line', () => {
  it('says in a sentence how far the work is', () => {
    expect(travellerSummary(line)).toBe('Traveller: 2 of 4 done, now pull')
    expect(travellerSummary([node('placed', 'done'), node('section', 'held')])).toBe('Traveller: 1 of 2 done, on hold before section')
    expect(travellerSummary([node('section', 'done'), node('pull', 'back')])).toBe('Traveller: 1 of 2 done, pull sent back')
    expect(travellerSummary([])).toBe('Traveller: no steps yet')
  })

  it('says the share of samples that are past each step', () => {
    const nodes = [node('placed', 'done'), node('section', 'part', { part: 0.75 }), node('machine', 'part', { part: 0.5 })]
    expect(travellerSummary(nodes, 40)).toBe('Traveller of 40 samples: 1 of 3 done, section 75 %, machine 50 %')
  })

  it('does not count void steps', () => {
    expect(travellerSummary([node('placed', 'done'), node('section', 'void'), node('machine', 'void')])).toBe('Traveller: void')
    expect(travellerSummary([node('placed', 'done'), node('section', 'void'), node('machine', 'todo')])).toBe('Traveller: 1 of 2 done')
  })

  it('is one spoken image in a row and a list with words on a page', () => {
    vi.spyOn(navigator, 'language', 'get').mockReturnValue('en-GB')
    render(<TravellerLine nodes={line} size="s" />)
    expect(screen.getByRole('img', { name: 'Traveller: 2 of 4 done, now pull' })).toBeTruthy()
    render(<TravellerLine nodes={line} size="l" zone="UTC" now={new Date('2026-03-10T10:42:00Z')} />)
    const steps = within(screen.getByRole('list', { name: 'Traveller' })).getAllByRole('listitem')
    expect(steps.map((step) => step.textContent)).toEqual(['placed2 Mardone', 'section6 Mar, 08:30Cutting 1done', 'pullsince 10:31Frame 100 kNnow', 'reportto come'])
    expect(steps[2]?.getAttribute('aria-current')).toBe('step')
  })

  it('says the time in the zone of the site', () => {
    const now = new Date('2026-03-10T10:42:00Z')
    expect(travellerTime(node('pull', 'todo', { kind: 'test', at: '2026-03-10T14:00:00Z' }), { now, zone: 'Europe/Berlin', locale: 'en-GB' })).toBe('15:00')
    expect(travellerTime(node('pull', 'held', { at: '2026-03-09T16:20:00Z' }), { now, zone: 'UTC', locale: 'en-GB' })).toBe('on hold since 9 Mar')
    expect(travellerTime(node('pull', 'void', { at: '2026-03-09T16:20:00Z' }), { now })).toBeUndefined()
  })
})
