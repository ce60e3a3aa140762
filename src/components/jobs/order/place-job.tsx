import { useState } from 'react'
import type { Job } from '../../../../shared/api/jobs.ts'
import { usePayJob } from '../../../api/jobs.ts'
import { Refusal } from '../../../lib/refusal.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Icon } from '../../ui/icon.tsx'
import type { OrderDraft } from '../draft/use-order-draft.ts'

/** What stops an order, with a way to it. */
export type Stopper = { words: string; go?: () => void }

/** Saves the draft and goes to the payment page; `go` may be handed to several buttons. */
export function usePlaceJob(job: Job, save: OrderDraft['save']) {
  const pay = usePayJob(job.id)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const go = async () => {
    setBusy(true)
    setRefusal(null)
    try {
      const { url } = await pay.mutateAsync({ version: await save() })
      window.location.assign(url)
    } catch (error) {
      setRefusal(error instanceof Refusal ? error : new Refusal('unexpected', 'The payment page did not open.'))
      setBusy(false)
    }
  }
  return { busy, refusal, go: () => void go() }
}

/** The one deed of the order page, with the reason beside it when it cannot be done yet. */
export function PlaceJob({ place, stopper, label = 'Place job and pay' }: { place: ReturnType<typeof usePlaceJob>; stopper: Stopper | null; label?: string }) {
  return (
    <div className="mt-4">
      <Button kind="main" size="big" wide busy={place.busy} refusal={stopper?.words} refusalAt="hidden" onClick={place.go} className="max-tablet:hidden">{label}</Button>
      <StopperWords stopper={stopper} refusal={place.refusal} />
    </div>
  )
}

function StopperWords({ stopper, refusal }: { stopper: Stopper | null; refusal: Refusal | null }) {
  const fields = Object.values(refusal?.fields ?? {})
  if (!stopper && !refusal) return null
  return (
    <div className="mt-2.5 grid gap-2 text-13 text-red">
      {stopper && (
        <p className="flex gap-2">
          <Icon name="stop" className="mt-px" />
          <span>{stopper.words} {stopper.go && <button type="button" className="underline underline-offset-3" onClick={stopper.go}>Go to it</button>}</span>
        </p>
      )}
      {refusal && (
        <div role="alert" className="flex gap-2">
          <Icon name="stop" className="mt-px" />
          <div>
            {refusal.message}
            {fields.length > 0 && <ul className="list-disc pl-4">{fields.slice(0, 5).map((words) => <li key={words}>{words}</li>)}</ul>}
          </div>
        </div>
      )}
    </div>
  )
}

/** On the phone: total and day always in sight, and the deed. */
export function BottomBar({ place, stopper, total, under }: { place: ReturnType<typeof usePlaceJob>; stopper: Stopper | null; total: string; under: string }) {
  return (
    <div className="fixed inset-x-0 bottom-0 z-20 flex items-center justify-between gap-4 border-t border-ink bg-sheet px-4 py-2.5 tablet:hidden">
      <p><b className="block text-20">{total}</b><span className="text-13 text-quiet">{under}</span></p>
      <Button kind="main" busy={place.busy} refusal={stopper?.words} refusalAt="hidden" onClick={place.go}>Place job</Button>
    </div>
  )
}
