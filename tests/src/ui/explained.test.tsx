import { cleanup, render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import type { Result, Verdict } from '../../../shared/method/method.ts'
import { Explained } from '../../../src/components/ui/explained/explained.tsx'

const result: Result = {
  key: 'rp', symbol: 'Rp0.2', value: 904.92, unit: 'MPa', reported: '905 MPa', expandedUncertainty: 8.7, coverageFactor: 2, basis: 'ISO 6892-1', approximate: false,
  derivation: [
    { text: 'Area', formula: 'S0 = π × 10.0033² / 4', clause: 'ISO 6892-1, 9', value: 78.592, unit: 'mm²' },
    { text: 'Rounded to 1 MPa', formula: '904.92 → 905', clause: 'ISO 6892-1, 22', reported: '905 MPa' },
  ],
}
const verdict: Verdict = { outcome: 'pass', rule: 'guarded', limits: [{ key: 'rp', outcome: 'pass', lower: 850, probabilityOfConformity: 0.9999 }] }

afterEach(cleanup)

describe('an explained number', () => {
  it('opens the chain from reading to decision, and gives the focus back', async () => {
    render(<Explained result={result} verdict={verdict} budget={[{ name: 'force, class 0.5', standardUncertainty: 2.61 }]} />)
    const button = screen.getByRole('button', { name: 'Rp0.2 905 MPa: where this number comes from' })
    await userEvent.click(button)
    const chain = within(screen.getByRole('dialog', { name: 'Where this number comes from' }))
    expect(chain.getByText('S0 = π × 10.0033² / 4')).toBeTruthy()
    expect(chain.getByText('78.592 mm²')).toBeTruthy()
    expect(chain.getByText('ISO 6892-1, 22')).toBeTruthy()
    expect(chain.getByText('± 8.7 MPa')).toBeTruthy()
    expect(chain.getByText('force, class 0.5')).toBeTruthy()
    expect(chain.getByText(/Meets 850 MPa or more/)).toBeTruthy()
    expect(chain.getByText('probability above 99.9 %')).toBeTruthy()
    await userEvent.keyboard('{Escape}')
    expect(screen.queryByRole('dialog')).toBeNull()
    expect(document.activeElement).toBe(button)
  })

  it('says that a converted number is approximate', async () => {
    render(<Explained result={{ ...result, approximate: true }} />)
    await userEvent.click(screen.getByRole('button'))
    expect(screen.getByText(/never for acceptance/)).toBeTruthy()
  })

  it('can open elsewhere', async () => {
    const explain = vi.fn()
    render(<Explained result={result} onExplain={explain} open />)
    const button = screen.getByRole('button')
    expect(button.getAttribute('aria-expanded')).toBe('true')
    await userEvent.click(button)
    expect(explain).toHaveBeenCalledOnce()
    expect(screen.queryByRole('dialog')).toBeNull()
  })
})
