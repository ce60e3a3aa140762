import { useState } from 'react'
import { Dialog } from '../../ui/feedback/dialog.tsx'
import { RadioGroup } from '../../ui/fields/radio-group.tsx'
import { TextField } from '../../ui/fields/text-field.tsx'

const ready = ['typed wrong', 'wrong place', 'the piece moved', 'the indenter or grip slipped', 'the machine was at fault']
const own = 'own words'

/** Asks why a reading is struck out. It stays on the record with its reason. */
export function StrikeDialog({ what, replacing = false, onStrike, onClose }: { /** "reading 4, 31.9" */ what: string; replacing?: boolean; onStrike: (reason: string) => void; onClose: () => void }) {
  const [choice, setChoice] = useState<string>()
  const [words, setWords] = useState('')
  const reason = choice === own ? words.trim() : (choice ?? '')
  return (
    <Dialog
      open onOpenChange={(open) => !open && onClose()} title={replacing ? `Replace ${what}?` : `Strike out ${what}?`} confirm={replacing ? 'Replace it' : 'Strike out'}
      refusal={reason === '' ? (choice === own ? 'Say why.' : 'Choose why.') : undefined} onConfirm={() => onStrike(reason)}
    >
      <p>It stays on the record with the reason and counts no more.</p>
      <RadioGroup legend="Why" value={choice} onValue={setChoice} choices={[...ready.map((label) => ({ value: label, label })), { value: own, label: 'for another reason' }]} />
      {choice === own && <TextField label="The reason" value={words} onChange={(event) => setWords(event.target.value)} maxLength={300} autoFocus />}
    </Dialog>
  )
}
