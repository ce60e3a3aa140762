import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react'
import { zodResolver } from '@hookform/resolvers/zod'
import userEvent from '@testing-library/user-event'
import { useState } from 'react'
import { useForm } from 'react-hook-form'
import { afterEach, describe, expect, it, vi } from 'vitest'
import * as z from 'zod'
import { formFields } from '../../../shared/method/form.ts'
import { initialValues, type Values } from '../../../src/components/ui/form/field-value.ts'
import { SchemaFields } from '../../../src/components/ui/form/schema-fields.tsx'
import { SchemaForm } from '../../../src/components/ui/form/schema-form.tsx'

const round = z.strictObject({ shape: z.literal('round').meta({ label: 'Round' }), diametersMm: z.array(z.number().positive()).min(2).max(3).meta({ label: 'Diameters', unit: 'mm', step: 0.01 }) })
const flat = z.strictObject({ shape: z.literal('flat').meta({ label: 'Flat' }), widthMm: z.number().positive().meta({ label: 'Width', unit: 'mm' }) })
const Parameters = z.strictObject({
  scale: z.enum(['HRC', 'HR15N']).meta({ label: 'Scale' }),
  thicknessMm: z.number().positive().max(100).optional().meta({ label: 'Thickness', unit: 'mm', step: 0.01 }),
  witnessed: z.boolean().optional().meta({ label: 'Witnessed' }),
  section: z.discriminatedUnion('shape', [round, flat]).meta({ label: 'Section' }),
  indents: z.array(z.strictObject({ d1: z.number().positive().meta({ label: 'd1', unit: 'µm' }) })).min(1).max(2).meta({ label: 'Indentations' }),
})
const fields = formFields(Parameters)

function Held({ onValue, problems }: { onValue: (value: Values) => void; problems?: Record<string, string> }) {
  const [value, setValue] = useState(initialValues(fields))
  return <SchemaFields fields={fields} value={value} problems={problems} path="parameters" onValue={(next) => { setValue(next); onValue(next) }} />
}

afterEach(cleanup)

describe('a form drawn from a schema', () => {
  it('draws every kind of field and gives a value that the schema takes', async () => {
    const onValue = vi.fn<(value: Values) => void>()
    render(<Held onValue={onValue} />)
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Scale' }), 'HR15N')
    await userEvent.type(screen.getByRole('spinbutton', { name: 'Thickness' }), '0.8')
    await userEvent.click(screen.getByRole('checkbox', { name: 'Witnessed' }))
    await userEvent.selectOptions(screen.getByRole('combobox', { name: 'Kind of section' }), 'Flat')
    await userEvent.type(screen.getByRole('spinbutton', { name: 'Width' }), '12,5')
    await userEvent.type(screen.getByRole('spinbutton', { name: 'd1' }), '340')
    expect(Parameters.parse(onValue.mock.lastCall?.[0])).toEqual({ scale: 'HR15N', thicknessMm: 0.8, witnessed: true, section: { shape: 'flat', widthMm: 12.5 }, indents: [{ d1: 340 }] })
  })

  it('leaves an emptied optional value out', async () => {
    const onValue = vi.fn<(value: Values) => void>()
    render(<Held onValue={onValue} />)
    const thickness = screen.getByRole('spinbutton', { name: 'Thickness' })
    await userEvent.type(thickness, '5')
    await userEvent.clear(thickness)
    expect(onValue.mock.lastCall?.[0]).not.toHaveProperty('thicknessMm')
  })

  it('says the limit that a number breaks, and what the server refused beside its field', async () => {
    render(<Held onValue={() => undefined} problems={{ 'parameters.indents.0.d1': 'must be above 20' }} />)
    await userEvent.type(screen.getByRole('spinbutton', { name: 'Thickness' }), '101')
    expect(screen.getByText('Has to be 100 mm or less.')).toBeTruthy()
    expect(screen.getByRole('spinbutton', { name: 'd1' }).getAttribute('aria-invalid')).toBe('true')
    expect(screen.getByText('must be above 20')).toBeTruthy()
  })

  it('takes pasted numbers into its list, and no more than are allowed', () => {
    const onValue = vi.fn<(value: Values) => void>()
    render(<Held onValue={onValue} />)
    fireEvent.paste(screen.getByRole('spinbutton', { name: 'Diameters 1' }), { clipboardData: { getData: () => '10.01\t10.00\t10,00\t9.99' } })
    expect(onValue.mock.lastCall?.[0]).toMatchObject({ section: { shape: 'round', diametersMm: [10.01, 10, 10] } })
    expect(screen.getByRole('button', { name: 'One more' }).getAttribute('aria-disabled')).toBe('true')
  })

  it('adds rows up to the most, with Enter too', async () => {
    render(<Held onValue={() => undefined} />)
    await userEvent.type(screen.getByRole('spinbutton', { name: 'd1' }), '340{Enter}')
    const boxes = screen.getAllByRole('spinbutton', { name: 'd1' })
    expect(boxes).toHaveLength(2)
    await waitFor(() => expect(document.activeElement).toBe(boxes[1]))
    expect(screen.getByRole('button', { name: 'Add a row' }).getAttribute('aria-disabled')).toBe('true')
  })

  it('works inside react-hook-form, with the errors of its resolver', async () => {
    const send = vi.fn()
    function Form() {
      const form = useForm({ resolver: zodResolver(z.object({ parameters: Parameters })), defaultValues: { parameters: {} } })
      return <form onSubmit={(event) => void form.handleSubmit(send)(event)}><SchemaForm control={form.control} name="parameters" fields={fields} /><button>Send</button></form>
    }
    render(<Form />)
    await userEvent.click(screen.getByRole('button', { name: 'Send' }))
    await waitFor(() => expect(screen.getByRole('combobox', { name: 'Scale' }).getAttribute('aria-invalid')).toBe('true'))
    expect(send).not.toHaveBeenCalled()
  })
})
