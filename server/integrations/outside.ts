import type { Integrations } from './create-integrations.ts'
import type { Settings } from './settings.ts'

/** The outside services of this process and what the environment says; set once when it starts. */
type Outside = Integrations & { settings: Settings }

let current: Outside | null = null

export function setOutside(outside: Outside): void {
  current = outside
}

/** Throws when the process has not been set up: a programming mistake, never a user's. */
export function outside(): Outside {
  if (!current) throw new Error('the outside services are not set up')
  return current
}
