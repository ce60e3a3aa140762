import { describe, expect, it } from 'vitest'
import type { StepNeed } from '../../../shared/method/method.ts'
import { travellerSteps } from '../../../shared/orders/traveller-steps.ts'

const need = (kind: StepNeed['kind'], more: Partial<StepNeed> = {}): StepNeed => ({ kind, capability: kind, setupMinutes: 5, runMinutes: 10, attended: 'setup', needs: {}, ...more })

describe('the steps of a sample', () => {
  it('section once, first and as long as the longest asks for, then each test in its order', () => {
    const steps = travellerSteps([
      { needs: [need('section', { runMinutes: 5, needs: { diameterMm: 60 } }), need('measure', { detail: 'HRC', capability: 'rockwell' })] },
      { needs: [need('section', { setupMinutes: 12, runMinutes: 20, attended: 'all', needs: { diameterMm: 40, lengthMm: 9 } }), need('mount'), need('measure', { detail: 'G' })] },
    ])
    expect(steps.map(({ label, test }) => [label, test])).toEqual([['section', null], ['measure HRC', 0], ['mount', 1], ['measure G', 1]])
    expect(steps[0]?.need).toEqual({ kind: 'section', capability: 'section', setupMinutes: 12, runMinutes: 20, attended: 'all', needs: { diameterMm: 60, lengthMm: 9 } })
    expect(steps[1]?.capability).toBe('rockwell')
  })

  it('leave a cut with the only test that asks for it', () => {
    expect(travellerSteps([{ needs: [need('measure')] }, { needs: [need('section'), need('pull')] }]).map(({ label, test }) => [label, test])).toEqual([['section', 1], ['measure', 0], ['pull', 1]])
    expect(travellerSteps([])).toEqual([])
  })
})
