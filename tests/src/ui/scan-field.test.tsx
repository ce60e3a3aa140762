import { cleanup, fireEvent, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { useKeys } from '../../../src/components/ui/buttons/use-keys.ts'
import { ScanField } from '../../../src/components/ui/fields/scan-field.tsx'

/** Keys as a scanner sends them, `gapMs` apart by the events' own clock. */
function keys(target: Element, text: string, gapMs: number) {
  let at = performance.now() + 1000
  for (const key of [...text, 'Enter']) {
    const event = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })
    Object.defineProperty(event, 'timeStamp', { value: (at += gapMs) })
    fireEvent(target, event)
  }
}
const later = () => new Promise((done) => setTimeout(done, 80))

function Page({ onScan, onSearch, onStrike = () => undefined }: { onScan: (code: string) => void; onSearch?: (text: string) => void; onStrike?: () => void }) {
  useKeys({ s: onStrike })
  return <><ScanField onScan={onScan} onSearch={onSearch} /><input aria-label="Reason" /><input aria-label="Reading" data-keys="letters" /></>
}

afterEach(cleanup)

describe('the scan field', () => {
  it('hears a scanner anywhere on the page', () => {
    const onScan = vi.fn()
    render(<Page onScan={onScan} />)
    keys(document.body, 'J-26-00417-03', 5)
    expect(onScan.mock.calls).toEqual([['J-26-00417-03']])
  })

  it('does not take hands for a scanner', () => {
    const onScan = vi.fn()
    render(<Page onScan={onScan} />)
    keys(document.body, 'J-26-00417-03', 120)
    expect(onScan).not.toHaveBeenCalled()
  })

  it('leaves text fields alone but hears a scanner in a number grid', () => {
    const onScan = vi.fn()
    render(<Page onScan={onScan} />)
    keys(screen.getByLabelText('Reason'), 'J-26-00417-03', 5)
    expect(onScan).not.toHaveBeenCalled()
    keys(screen.getByLabelText('Reading'), 'J-26-00417-03', 5)
    expect(onScan).toHaveBeenCalledWith('J-26-00417-03')
  })

  it('leaves the digits of a gauge that types to the number grid: they are a reading, not a code', () => {
    const onScan = vi.fn()
    render(<Page onScan={onScan} />)
    keys(screen.getByLabelText('Reading'), '31.25', 5)
    expect(onScan).not.toHaveBeenCalled()
  })

  it('does not let the letters of a code act as keys', async () => {
    const onStrike = vi.fn()
    render(<Page onScan={() => undefined} onStrike={onStrike} />)
    keys(document.body, 'S26S', 5)
    await later()
    expect(onStrike).not.toHaveBeenCalled()
    fireEvent.keyDown(document.body, { key: 's' })
    await later()
    expect(onStrike).toHaveBeenCalledOnce()
  })

  it('gets the cursor by / and searches for what was typed by hand', async () => {
    const onSearch = vi.fn()
    const onScan = vi.fn()
    render(<Page onScan={onScan} onSearch={onSearch} />)
    fireEvent.keyDown(document.body, { key: '/' })
    await later()
    const input = screen.getByRole('textbox', { name: 'Scan a label or search' })
    expect(document.activeElement).toBe(input)
    await userEvent.setup({ delay: 60 }).type(input, '42Cr{Enter}')
    expect(onSearch).toHaveBeenCalledWith('42Cr')
    expect(onScan).not.toHaveBeenCalled()
  })
})
