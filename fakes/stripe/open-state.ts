import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { dirname } from 'node:path'
import { StripeState } from './stripe-state.ts'

export type OpenState = {
  state: StripeState
  /** Call after every change, before anything is answered. */
  save: () => void
}

const idempotencyKeptSeconds = 24 * 60 * 60

/** The state from its file, or an empty one; without a file it lives in memory only. */
export function openState(file: string | undefined): OpenState {
  const state = file && existsSync(file) ? StripeState.parse(JSON.parse(readFileSync(file, 'utf8'))) : emptyState()
  return {
    state,
    save() {
      forgetOldKeys(state)
      if (!file) return
      mkdirSync(dirname(file), { recursive: true })
      writeFileSync(`${file}.new`, JSON.stringify(state), { mode: 0o600 })
      renameSync(`${file}.new`, file)
    },
  }
}

function emptyState(): StripeState {
  return { checkouts: {}, payments: {}, refunds: {}, events: {}, idempotency: {} }
}

function forgetOldKeys(state: StripeState): void {
  const oldest = Date.now() / 1000 - idempotencyKeptSeconds
  for (const [key, record] of Object.entries(state.idempotency)) if (record.created < oldest) delete state.idempotency[key]
}
