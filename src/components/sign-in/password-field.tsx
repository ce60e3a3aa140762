import { useState, type ComponentPropsWithRef } from 'react'
import { TextField } from '../ui/fields/text-field.tsx'

/** A password that can be shown while it is typed. `autoComplete` tells the password manager which one is meant. */
export function PasswordField({ label = 'Password', ...field }: Omit<ComponentPropsWithRef<typeof TextField>, 'label' | 'type' | 'unit' | 'autoComplete'> & { label?: string; autoComplete: 'current-password' | 'new-password' }) {
  const [shown, setShown] = useState(false)
  const toggle = (
    <button type="button" aria-pressed={shown} aria-label={`Show ${label.toLowerCase()}`} onClick={() => setShown(!shown)} className="-mr-1.5 min-h-small rounded px-2 text-ink underline decoration-edge underline-offset-3">
      {shown ? 'Hide' : 'Show'}
    </button>
  )
  return <TextField {...field} label={label} type={shown ? 'text' : 'password'} spellCheck={false} autoCapitalize="off" unit={toggle} />
}
