import { useState, type FormEvent } from 'react'
import type { Sample } from '../../../shared/api/samples.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import { useReceiveSample } from '../../api/samples.ts'
import { after } from '../../lib/after.ts'
import { Refusal } from '../../lib/refusal.ts'
import { useTyped } from '../../lib/kept-readings/use-typed.ts'
import { Button } from '../ui/buttons/button.tsx'
import { Note } from '../ui/feedback/note.tsx'
import { useToast } from '../ui/feedback/toast-region.tsx'
import { RadioGroup } from '../ui/fields/radio-group.tsx'
import { TextField } from '../ui/fields/text-field.tsx'
import { Pairs } from '../ui/pairs.tsx'
import { MismatchFields, readMismatch } from './mismatch-fields.tsx'
import { MissingDialog } from './missing-dialog.tsx'
import { SamplePhotos } from './sample-photos.tsx'

const conditions = ['as ordered, undamaged', 'surface rust', 'bent', 'cracked or chipped', 'wet or oily', 'label missing']

/** Takes one sample in: does it match, how did it come, a photo; Enter receives it and goes on to the next. */
export function ReceiveSample({ sample, onDone }: { sample: Sample; onDone: () => void }) {
  const receive = useReceiveSample(sample.id)
  const say = useToast()
  const [typed, type, clear] = useTyped(`receive.${sample.id}`)
  const [isMissing, setIsMissing] = useState(false)
  const condition = typed['condition'] ?? conditions[0] ?? ''
  const differs = typed['matches'] === 'no'
  const mismatch = readMismatch(typed)
  const refusal = condition.trim() === '' ? 'Say how it came.' : differs && !mismatch ? 'Say what does not match, and what the customer is asked.' : ''
  const fields = receive.error instanceof Refusal ? receive.error.fields : {}
  const submit = (event: FormEvent) => {
    event.preventDefault()
    if (refusal || receive.isPending) return
    after(receive.mutateAsync({ version: sample.version, condition: condition.trim(), mismatch: differs ? mismatch : null }), () => {
      clear()
      say({ text: differs ? `${sample.number} received and on hold; the customer is asked.` : `${sample.number} received.` })
      onDone()
    })
  }
  return (
    <section aria-label={`Receive ${sample.number}`} className="on-sheet border border-line bg-sheet p-5 max-tablet:-mx-gutter max-tablet:border-x-0 max-tablet:px-gutter">
      <h2 className="mono mb-1 text-26! font-medium tracking-tight">{sample.number}</h2>
      <Pairs className="mb-4" items={[
        ['What', [sample.material, `${sample.piece.form} ${sizeText(sample.piece)}`.trim()].filter(Boolean).join(', ')], ['Heat', sample.heat ? <span className="mono">{sample.heat}</span> : 'not given'], ['Lot', sample.lot ? <span className="mono">{sample.lot}</span> : 'not given'],
        ['For', sample.tests.map(({ label }) => label).join(', ') || 'no test'],
      ]} />
      <form onSubmit={submit} className="grid gap-4">
        <div>
          <TextField label="How it came" value={condition} maxLength={300} onChange={(event) => type({ condition: event.target.value })} onFocus={(event) => event.target.select()} error={fields['condition']} />
          <div className="mt-2 flex flex-wrap gap-2">
            {conditions.map((words) => <Button key={words} kind="soft" size="tiny" className="min-h-control! aria-pressed:border-ink aria-pressed:bg-wash" aria-pressed={condition === words} onClick={() => type({ condition: words })}>{words}</Button>)}
          </div>
        </div>
        <RadioGroup across legend="Does it match what was ordered?" value={differs ? 'no' : 'yes'} onValue={(matches) => type({ matches })} choices={[{ value: 'yes', label: 'It matches' }, { value: 'no', label: 'It does not match' }]} />
        {differs && <MismatchFields typed={typed} type={type} fields={fields} />}
        <SamplePhotos sample={sample} />
        {receive.error && <Note kind="bad" title="Not received.">{receive.error.message}</Note>}
        <div className="flex flex-wrap items-center gap-3">
          {/* the cursor waits here and not in the text, where the next label's scan would be typed */}
          <Button kind="main" type="submit" keys="Enter" autoFocus busy={receive.isPending} refusal={refusal} refusalAt="below">{differs ? 'Receive, hold and ask' : 'Receive'}</Button>
          {sample.state === 'expected' && <Button kind="soft" onClick={() => setIsMissing(true)}>Not in the parcel</Button>}
        </div>
      </form>
      {isMissing && <MissingDialog sample={sample} onClose={() => setIsMissing(false)} onDone={() => { setIsMissing(false); onDone() }} />}
    </section>
  )
}
