import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { Button } from '../../../src/components/ui/buttons/button.tsx'
import { Dialog } from '../../../src/components/ui/feedback/dialog.tsx'
import { TextField } from '../../../src/components/ui/fields/text-field.tsx'

function Page({ onConfirm, refusal }: { onConfirm: () => void; refusal?: string }) {
  const [open, setOpen] = useState(false)
  return (
    <>
      <Button onClick={() => setOpen(true)}>Strike out 4</Button>
      <Dialog open={open} onOpenChange={setOpen} title="Strike out reading 4?" confirm="Strike out" refusal={refusal} onConfirm={onConfirm}>
        <TextField label="Reason" />
      </Dialog>
    </>
  )
}

afterEach(cleanup)

describe('a dialog', () => {
  it('asks, keeps the focus inside, and gives it back to what opened it', async () => {
    const confirm = vi.fn()
    render(<Page onConfirm={confirm} />)
    await userEvent.click(screen.getByRole('button', { name: 'Strike out 4' }))
    const dialog = screen.getByRole('dialog', { name: 'Strike out reading 4?' })
    expect(dialog.contains(document.activeElement)).toBe(true)
    await userEvent.keyboard('{Escape}')
    expect(screen.queryByRole('dialog')).toBeNull()
    expect(document.activeElement).toBe(screen.getByRole('button', { name: 'Strike out 4' }))
    expect(confirm).not.toHaveBeenCalled()
  })

  it('is confirmed by its button and by Enter in its field, and not while refused', async () => {
    const confirm = vi.fn()
    const { rerender } = render(<Page onConfirm={confirm} />)
    await userEvent.click(screen.getByRole('button', { name: 'Strike out 4' }))
    await userEvent.type(screen.getByRole('textbox', { name: 'Reason' }), 'too near{Enter}')
    await userEvent.click(screen.getByRole('button', { name: 'Strike out' }))
    expect(confirm).toHaveBeenCalledTimes(2)
    rerender(<Page onConfirm={confirm} refusal="Say why first." />)
    await userEvent.type(screen.getByRole('textbox', { name: 'Reason' }), '{Enter}')
    expect(confirm).toHaveBeenCalledTimes(2)
  })
})
