import { useState } from 'react'
import type { Job } from '../../../../shared/api/jobs.ts'
import { useCancelJob } from '../../../api/jobs.ts'
import { refusalWords, refusedField } from '../../../lib/refused-field.ts'
import { formatMoney } from '../../../lib/format.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Dialog } from '../../ui/feedback/dialog.tsx'
import { TextArea } from '../../ui/fields/text-area.tsx'

/** Calls a job off before its samples are in work; says first what is paid back. */
export function CancelJob({ job }: { job: Job }) {
  const [open, setOpen] = useState(false)
  const [reason, setReason] = useState('')
  const [asked, setAsked] = useState(false)
  const cancel = useCancelJob(job.id)
  if (job.state !== 'placed' && job.state !== 'awaiting samples') return null
  const confirm = () => {
    setAsked(true)
    if (reason.trim()) cancel.mutate({ version: job.version, reason: reason.trim() }, { onSuccess: () => setOpen(false) })
  }
  return (
    <>
      <Button kind="soft" onClick={() => setOpen(true)}>Cancel job</Button>
      <Dialog open={open} onOpenChange={setOpen} title={`Cancel job ${job.number}?`} confirm="Cancel job" cancel="Keep the job" danger busy={cancel.isPending} error={refusalWords(cancel.error, ['reason'])} onConfirm={confirm}>
        <p>{job.money === 'paid' ? `All of the ${formatMoney(job.totalMinor, job.currency)} paid goes back to the card it came from.` : 'Nothing was paid, so nothing is paid back.'} The samples are no longer expected; those sent already are returned.</p>
        <TextArea label="Reason" rows={2} maxLength={500} value={reason} onChange={(event) => setReason(event.target.value)} error={refusedField(cancel.error, 'reason') ?? (asked && !reason.trim() ? 'Say why, in a few words.' : undefined)} />
      </Dialog>
    </>
  )
}
