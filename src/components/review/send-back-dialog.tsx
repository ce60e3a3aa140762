import { useState } from 'react'
import type { TestRun } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import { refusedField } from '../../lib/refused-field.ts'
import { Dialog } from '../ui/feedback/dialog.tsx'
import { TextArea } from '../ui/fields/text-area.tsx'
import { Tick } from '../ui/fields/tick.tsx'
import { keepRemark, keptRemark } from './kept-remark.ts'
import { readingName } from './readings-section.tsx'
import { valueWords } from './value-words.ts'

/** Asks what has to be done again and why, and which readings it is about. The run stays on record; a new one is made at the bench. */
export function SendBackDialog({ run, open, onOpenChange, busy, error, onSend }: {
  run: TestRun
  open: boolean
  onOpenChange: (open: boolean) => void
  busy: boolean
  error: Error | null
  onSend: (said: { remark: string; readings: string[] }) => void
}) {
  const [remark, setRemark] = useState(() => keptRemark(run.id))
  const [chosen, setChosen] = useState<ReadonlySet<string>>(new Set())
  const live = run.readings.filter(({ struck }) => !struck)
  const method = methodOf(run.methodId)
  const write = (text: string) => {
    setRemark(text)
    keepRemark(run.id, text)
  }
  const pick = (id: string, on: boolean) => setChosen((now) => new Set(on ? [...now, id] : [...now].filter((one) => one !== id)))
  return (
    <Dialog
      open={open} onOpenChange={onOpenChange} title={`Send ${run.sampleNumber} back to the bench?`} confirm="Send back" busy={busy} error={error?.message}
      refusal={remark.trim() === '' ? 'Say what has to be done again, and why.' : undefined} onConfirm={() => onSend({ remark: remark.trim(), readings: [...chosen] })}
    >
      <p>This run stays on record as it is. {run.performedBy} sees your remark, and the step is planned again.</p>
      <TextArea label="What has to be done again, and why" rows={4} maxLength={1000} value={remark} onChange={(event) => write(event.target.value)} error={refusedField(error, 'remark')} />
      {live.length > 0 && (
        <fieldset>
          <legend className="mb-1.5 flex w-full justify-between text-13 font-medium">Readings it is about <span className="font-normal text-quiet">if any</span></legend>
          <div className="grid max-h-56 gap-1.5 overflow-y-auto">
            {live.map((reading) => <Tick key={reading.id} label={<>{readingName(method, reading)} <span className="text-quiet">{shortened(valueWords(undefined, reading.value))}</span></>} checked={chosen.has(reading.id)} onChange={(event) => pick(reading.id, event.target.checked)} />)}
          </div>
        </fieldset>
      )}
    </Dialog>
  )
}

const shortened = (text: string) => (text.length > 60 ? `${text.slice(0, 58)}…` : text)
