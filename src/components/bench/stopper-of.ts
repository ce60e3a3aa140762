import type { QueueState } from '../../lib/kept-readings/reading-queue.ts'
import type { Live } from '../../methods/sheet-view.ts'

/** Why the run cannot be recorded now, as a sentence; empty when it can. The first thing to put right comes first. */
export function stopperOf({ live, state, isHalfTyped, isBehind, needsRemark }: { live: Live; state: QueueState; isHalfTyped: boolean; isBehind: boolean; needsRemark: boolean }): string {
  const error = live.checks.find(({ severity }) => severity === 'error')
  if (state.clashes.size > 0) return 'Two screens have kept the same place: choose one.'
  if (live.failure) return sentence(live.failure)
  if (error) return sentence(error.message.split(': ')[0] ?? error.message)
  if (isHalfTyped) return 'What is typed is not kept yet: Enter keeps it.'
  if (live.results.length === 0) return 'There is no result yet.'
  if (state.unsent.length > 0) return state.going === 'waiting' ? 'The server has to have all readings first; it cannot be reached now.' : 'The readings are on their way to the server.'
  if (needsRemark) return 'A remark has to explain the warning.'
  return isBehind ? 'The result is being worked out.' : ''
}

function sentence(text: string): string {
  const said = text.charAt(0).toUpperCase() + text.slice(1)
  return /[.!?]$/.test(said) ? said : `${said}.`
}
