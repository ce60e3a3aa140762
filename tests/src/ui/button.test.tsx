import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Button } from '../../../src/components/ui/buttons/button.tsx'

afterEach(cleanup)

describe('a refused button', () => {
  it('stays reachable, says why, and does nothing', async () => {
    const press = vi.fn()
    render(<Button kind="main" refusal="You ran this test. Someone else has to review it." onClick={press}>Accept run</Button>)
    const button = screen.getByRole('button', { name: 'Accept run' })
    expect(button.getAttribute('aria-disabled')).toBe('true')
    expect(document.getElementById(button.getAttribute('aria-describedby') ?? '')?.textContent).toBe('You ran this test. Someone else has to review it.')
    await userEvent.tab()
    expect(document.activeElement).toBe(button)
    await userEvent.keyboard('{Enter}')
    await userEvent.click(button)
    expect(press).not.toHaveBeenCalled()
  })

  it('does not send the form it stands in', async () => {
    const send = vi.fn((event: { preventDefault: () => void }) => event.preventDefault())
    const { rerender } = render(<form onSubmit={send}><Button type="submit" refusal="A purchase order is missing.">Place job</Button></form>)
    await userEvent.click(screen.getByRole('button'))
    expect(send).not.toHaveBeenCalled()
    rerender(<form onSubmit={send}><Button type="submit">Place job</Button></form>)
    await userEvent.click(screen.getByRole('button'))
    expect(send).toHaveBeenCalledOnce()
  })

  it('takes no second press while it is busy', async () => {
    const press = vi.fn()
    render(<Button busy onClick={press}>Issuing report</Button>)
    await userEvent.click(screen.getByRole('button', { name: 'Issuing report' }))
    expect(press).not.toHaveBeenCalled()
  })

  it('names its key as ARIA writes it', () => {
    render(<Button keys="Ctrl Enter">Record run</Button>)
    expect(screen.getByRole('button').getAttribute('aria-keyshortcuts')).toBe('Control+Enter')
  })
})
