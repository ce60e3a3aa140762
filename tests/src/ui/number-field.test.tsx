import { cleanup, render, screen } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { afterEach, describe, expect, it, vi } from 'vitest'
import { NumberField } from '../../../src/components/ui/fields/number-field.tsx'
import { readNumber } from '../../../src/components/ui/fields/read-number.ts'

function Held({ start, onValue, ...rest }: { start?: number; onValue?: (value: number | undefined) => void; step?: number; min?: number; arrows?: boolean }) {
  const [value, setValue] = useState(start)
  return <NumberField label="Diameter" unit="mm" {...rest} value={value} onValue={(next) => { setValue(next); onValue?.(next) }} />
}

afterEach(() => {
  cleanup()
  vi.unstubAllGlobals()
})

describe('reading a typed number', () => {
  it('takes point and comma as decimal mark, and spaces between thousands', () => {
    expect(readNumber('31.4', 'en-GB')).toEqual({ value: 31.4 })
    expect(readNumber('31,4', 'en-GB')).toEqual({ value: 31.4 })
    expect(readNumber('31.4', 'de-DE')).toEqual({ value: 31.4 })
    expect(readNumber('71 120', 'en-GB')).toEqual({ value: 71120 })
    expect(readNumber('−4.5', 'en-GB')).toEqual({ value: -4.5 })
    expect(readNumber('0,475', 'en-GB')).toEqual({ value: 0.475 })
    expect(readNumber(' ', 'en-GB')).toEqual({ value: undefined })
  })

  it('refuses what could be a thousandfold of what was meant', () => {
    expect(readNumber('1,234', 'en-GB')).toEqual({ value: undefined, problem: '1,234 can be read two ways: type 1234 or 1.234.' })
    expect(readNumber('1.234', 'de-DE')).toEqual({ value: undefined, problem: '1.234 can be read two ways: type 1234 or 1,234.' })
    expect(readNumber('1,234.5', 'en-GB').problem).toBe('Type the number without marks between thousands.')
    expect(readNumber('abc', 'en-GB').problem).toBe('abc is not a number.')
  })
})

describe('a number field', () => {
  it('hands on each number, undefined when empty, and says what it cannot read', async () => {
    const onValue = vi.fn()
    render(<Held onValue={onValue} />)
    const input = screen.getByRole('spinbutton', { name: 'Diameter' })
    await userEvent.type(input, '3x')
    expect(onValue.mock.calls.map(([value]: unknown[]) => value)).toEqual([3, undefined])
    expect(screen.getByRole('alert').textContent).toBe('3x is not a number.')
    expect(input.getAttribute('aria-invalid')).toBe('true')
    await userEvent.clear(input)
    expect(onValue).toHaveBeenLastCalledWith(undefined)
    expect(screen.queryByRole('alert')).toBeNull()
  })

  it('shows the decimals of its step when it is left', async () => {
    render(<Held start={60} step={0.01} />)
    const input = screen.getByRole<HTMLInputElement>('spinbutton')
    expect(input.value).toBe('60.00')
    await userEvent.clear(input)
    await userEvent.type(input, '9,5')
    expect(input.value).toBe('9,5')
    await userEvent.tab()
    expect(input.value).toBe('9.50')
  })

  it('steps by the arrow keys without leaving its limits or the decimal grid', async () => {
    const onValue = vi.fn()
    render(<Held start={0.2} step={0.1} min={0} onValue={onValue} />)
    await userEvent.click(screen.getByRole('spinbutton'))
    await userEvent.keyboard('{ArrowUp}')
    expect(onValue).toHaveBeenLastCalledWith(0.3)
    await userEvent.keyboard('{ArrowDown}{ArrowDown}{ArrowDown}{ArrowDown}')
    expect(onValue).toHaveBeenLastCalledWith(0)
  })

  it('leaves the arrow keys to a grid that asks for them', async () => {
    const onValue = vi.fn()
    render(<Held start={1} step={1} arrows={false} onValue={onValue} />)
    await userEvent.click(screen.getByRole('spinbutton'))
    await userEvent.keyboard('{ArrowUp}')
    expect(onValue).not.toHaveBeenCalled()
  })
})
