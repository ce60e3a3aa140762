import { useEffect, useRef } from 'react'
import { useSearchParams } from 'react-router-dom'
import type { Job } from '../../../../shared/api/jobs.ts'
import { useCheckPayment } from '../../../api/jobs.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Note } from '../../ui/feedback/note.tsx'

/**
 * For the client who comes back from the payment page: asks once how the payment stands, and says it. The service's own word may come
 * later than its customer; the page then changes by itself.
 */
export function PaymentReturn({ job }: { job: Job }) {
  const [, setParams] = useSearchParams()
  const check = useCheckPayment(job.id)
  const asked = useRef(false)
  useEffect(() => {
    if (asked.current) return
    asked.current = true
    check.mutate(undefined)
  }, [check])
  const close = () => setParams((now) => {
    const next = new URLSearchParams(now)
    next.delete('payment')
    return next
  }, { replace: true })
  if (job.state !== 'draft') {
    return <Note live icon="check" className="mb-6" title="Payment received." actions={<Button size="tiny" kind="soft" onClick={close}>Close</Button>}>Job {job.number} is placed. Print the labels and the packing slip, and send the samples to {job.siteName}.</Note>
  }
  return (
    <Note live kind="warn" className="mb-6" icon="clock" title="Waiting for the payment service." actions={<Button size="tiny" busy={check.isPending} onClick={() => check.mutate(undefined)}>Ask again</Button>}>
      {check.isPending ? 'Asking how the payment stands.' : 'It has not confirmed the payment yet. This page changes by itself when it does; you may leave it.'}
      {check.error && <span role="alert" className="mt-1 block text-red">{check.error.message}</span>}
    </Note>
  )
}
