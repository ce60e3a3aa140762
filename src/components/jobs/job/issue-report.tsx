import { useState } from 'react'
import type { Job } from '../../../../shared/api/jobs.ts'
import { useIssueReport } from '../../../api/jobs.ts'
import { asSentence, refusalWords, refusedField } from '../../../lib/refused-field.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Dialog } from '../../ui/feedback/dialog.tsx'
import { useToast } from '../../ui/feedback/toast-region.tsx'
import { TextField } from '../../ui/fields/text-field.tsx'

/** Signs for the report of a job. The password is asked again: a signature is given by a person, not by an open screen. */
export function IssueReport({ job }: { job: Job }) {
  const [open, setOpen] = useState(false)
  const [password, setPassword] = useState('')
  const issue = useIssueReport(job.id)
  const say = useToast()
  const revision = job.reports.length > 0
  const turn = (next: boolean) => {
    setOpen(next)
    setPassword('')
    issue.reset()
  }
  const confirm = () => issue.mutate({ version: job.version, password }, {
    onSuccess: () => {
      turn(false)
      say({ text: 'The report is being made; it appears here and is mailed when it is signed.' })
    },
  })
  return (
    <>
      <Button kind="main" refusal={job.notYetReportable && asSentence(job.notYetReportable)} refusalAt="before" onClick={() => turn(true)}>{revision ? 'Issue a revision' : 'Issue report'}</Button>
      <Dialog open={open} onOpenChange={turn} title={`Sign and issue the report of ${job.number}?`} confirm="Sign and issue" cancel="Not yet" busy={issue.isPending} error={refusalWords(issue.error, ['password'])} refusal={password ? undefined : 'Your password is needed.'} onConfirm={confirm}>
        <p>All {job.samples.length === 1 ? 'results of its sample' : `results of its ${job.samples.length} samples`} are reported as they were accepted, signed with the lab’s key, and mailed to {job.customerName}. An issued report never changes; a correction is a new revision.</p>
        <TextField label="Your password" type="password" autoComplete="current-password" value={password} onChange={(event) => setPassword(event.target.value)} error={refusedField(issue.error, 'password')} />
      </Dialog>
    </>
  )
}
