import { useState } from 'react'
import { Dialog } from '../../ui/feedback/dialog.tsx'
import { TextArea } from '../../ui/fields/text-area.tsx'

/** Asks why a run is given up. It stays on record, and the test is ready for another. */
export function StopDialog({ busy, error, onStop, onClose }: { busy: boolean; error: string | undefined; onStop: (reason: string) => void; onClose: () => void }) {
  const [reason, setReason] = useState('')
  return (
    <Dialog
      open onOpenChange={(open) => !open && onClose()} title="Stop this run?" confirm="Stop the run" cancel="Go on with it" danger busy={busy} error={error}
      refusal={reason.trim() === '' ? 'Say why.' : undefined} onConfirm={() => onStop(reason.trim())}
    >
      <p>Its readings stay on record. The test is ready for another run afterwards.</p>
      <TextArea label="Why" value={reason} onChange={(event) => setReason(event.target.value)} maxLength={500} />
    </Dialog>
  )
}
