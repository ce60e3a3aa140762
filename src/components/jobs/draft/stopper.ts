import type { Order, OrderFault } from '../../../../shared/api/orders.ts'
import { asSentence } from '../../../lib/refused-field.ts'
import type { Stopper } from '../order/place-job.tsx'
import { rowFaults } from './row-faults.ts'
import type { OrderDraft } from './use-order-draft.ts'

/** Why the order cannot be placed yet, with the way to the first thing that has to be put right; null when it can. */
export function stopperOf({ state, conflict, saving }: Pick<OrderDraft, 'state' | 'conflict' | 'saving'>, order: Order, faults: readonly OrderFault[]): Stopper | null {
  if (conflict) return { words: 'Choose first which of the two drafts goes on.' }
  if (order.samples.length === 0) return { words: 'The order has no samples yet.' }
  const byRow = rowFaults(state, faults)
  const general = faults.find(({ row }) => row === null)
  if (general) return { words: asSentence(general.message) }
  const places = state.rows.flatMap(({ id }, place) => (byRow.has(id) ? [{ id, place }] : []))
  const [first] = places
  if (first) {
    const words = places.length === 1 ? `Row ${first.place + 1} has to be put right first.` : `${places.length} rows have to be put right first, row ${first.place + 1} to begin with.`
    return { words, go: () => goTo(first.id, byRow.get(first.id)?.[0]?.cell ?? 'heat') }
  }
  if (saving.trouble && saving.unsaved && saving.trouble.code === 'not-acceptable') return { words: asSentence(saving.trouble.message) }
  return null
}

function goTo(id: string, cell: string): void {
  const control = document.getElementById(`cell-${id}-${cell}`)
  const target = control ?? document.getElementById(`why-${id}`)
  target?.scrollIntoView({ block: 'center' })
  control?.focus({ preventScroll: true })
}
