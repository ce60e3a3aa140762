import { useState } from 'react'
import type { Sample } from '../../../shared/api/samples.ts'
import { useReportMissing } from '../../api/samples.ts'
import { after } from '../../lib/after.ts'
import { Dialog } from '../ui/feedback/dialog.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { TextField } from '../ui/fields/text-field.tsx'

/** Says that a sample did not come with its parcel; it goes on hold and the customer is asked. */
export function MissingDialog({ sample, onDone, onClose }: { sample: Sample; onDone: () => void; onClose: () => void }) {
  const report = useReportMissing(sample.id)
  const say = useToast()
  const [remark, setRemark] = useState('')
  return (
    <Dialog
      open onOpenChange={(open) => !open && onClose()} title={`Is ${sample.number} not in the parcel?`} confirm="It is missing" busy={report.isPending} error={report.error?.message}
      onConfirm={() => after(report.mutateAsync({ version: sample.version, remark: remark.trim() }), () => { say({ text: `${sample.number} is missing; the customer is asked.` }); onDone() })}
    >
      <p>It goes on hold, and the customer is asked when it comes. It can still be received later.</p>
      <TextField label="Remark" aside="if any" value={remark} onChange={(event) => setRemark(event.target.value)} maxLength={500} />
    </Dialog>
  )
}
