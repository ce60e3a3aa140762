import type { Job } from '../../../../shared/api/jobs.ts'
import { useReopenDraft } from '../../../api/jobs.ts'
import { formatTime } from '../../../lib/format.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Note } from '../../ui/feedback/note.tsx'
import { Live } from '../../ui/live.tsx'
import type { usePlaceJob } from './place-job.tsx'
import type { OrderDraft } from '../draft/use-order-draft.ts'

/** Where what was typed is: here, on the server, or both. */
export function SavingWords({ saving: { busy, unsaved, savedAt, trouble }, zone }: { saving: OrderDraft['saving']; zone: string }) {
  const out = trouble?.code === 'unreachable' || trouble?.code === 'unavailable'
  if (unsaved && out) return <Live broken>kept on this device; the server is out of reach</Live>
  if (unsaved && trouble) return <Live broken>kept on this device only</Live>
  if (busy || unsaved) return <Live>kept on this device, being sent</Live>
  return <Live>{savedAt === null ? 'kept here as you type' : `kept ${formatTime(new Date(savedAt), { zone })}, on this device and here`}</Live>
}

/** The draft was changed elsewhere while it was changed here: both are there, one has to be chosen. */
export function ConflictNote({ draft: { conflict, keepMine, takeTheirs, state }, job }: { draft: OrderDraft; job: Job }) {
  if (!conflict) return null
  return (
    <Note
      kind="warn" live className="mb-5" title="This draft was changed elsewhere while you changed it here."
      actions={
        <>
          <Button size="tiny" onClick={keepMine}>Keep what is here, {count(state.rows.length)}</Button>
          <Button size="tiny" kind="soft" onClick={takeTheirs}>Take the other, {count(job.order.samples.length)}</Button>
        </>
      }
    >
      Nothing is lost: choose which of the two goes on.
    </Note>
  )
}

const count = (samples: number) => (samples === 1 ? '1 sample' : `${samples} samples`)

/** The payment page is open: the order stands still until it is paid or taken back. */
export function WaitsNote({ job, place, left }: { job: Job; place: ReturnType<typeof usePlaceJob>; left: boolean }) {
  const reopen = useReopenDraft(job.id)
  return (
    <Note
      kind="warn" icon="lock" live className="mb-6" title={left ? 'You left the payment page.' : 'This job waits for payment.'}
      actions={
        <>
          <Button size="tiny" busy={place.busy} onClick={place.go}>Go on paying</Button>
          <Button size="tiny" kind="soft" busy={reopen.isPending} onClick={() => reopen.mutate({ version: job.version })}>Change the order</Button>
        </>
      }
    >
      {left ? 'Nothing was charged. ' : ''}The order cannot change while its payment page is open.
      {(reopen.error ?? place.refusal) && <span role="alert" className="mt-1 block text-red">{(reopen.error ?? place.refusal)?.message}</span>}
    </Note>
  )
}
