import type { Typed } from '../../lib/kept-readings/half-typed.ts'
import { Button } from '../ui/buttons/button.tsx'
import { TextArea } from '../ui/fields/text-area.tsx'
import { TextField } from '../ui/fields/text-field.tsx'

const reasons = ['the heat number differs', 'the size differs', 'another material', 'too small for the test', 'damaged']
const answers = ['Go on with what came', 'We send another', 'Leave this sample out']

/** What does not match and what the customer is asked. Answers are offered, so that one press settles it. */
export function MismatchFields({ typed, type, fields }: { typed: Typed; type: (change: Typed) => void; fields: Readonly<Record<string, string>> }) {
  return (
    <div className="grid gap-4 border-l-3 border-amber pl-4">
      <div>
        <TextField label="What does not match" value={typed['reason'] ?? ''} maxLength={300} onChange={(event) => type({ reason: event.target.value })} error={fields['mismatch.reason']} />
        <div className="mt-2 flex flex-wrap gap-2">{reasons.map((words) => <Button key={words} kind="soft" size="tiny" className="min-h-control!" onClick={() => type({ reason: words })}>{words}</Button>)}</div>
      </div>
      <TextArea label="Question to the customer" rows={2} maxLength={500} value={typed['question'] ?? ''} onChange={(event) => type({ question: event.target.value })} placeholder="Which heat is right?" error={fields['mismatch.question']} />
      <fieldset className="grid gap-2">
        <legend className="mb-1 text-13 font-medium">Answers to choose from</legend>
        {[0, 1, 2, 3].map((place) => (
          <TextField key={place} label={`Answer ${place + 1}`} labelHidden value={answerAt(typed, place)} maxLength={120} onChange={(event) => type({ [`answer.${place}`]: event.target.value === '' ? ' ' : event.target.value })} error={fields[`mismatch.answers.${place}`]} />
        ))}
      </fieldset>
    </div>
  )
}

/** The mismatch as it is sent; null while reason or question are missing. */
export function readMismatch(typed: Typed): { reason: string; question: string; answers: string[] } | null {
  const reason = sentence(typed['reason']?.trim() ?? '')
  const question = typed['question']?.trim() ?? ''
  return reason && question ? { reason, question, answers: [0, 1, 2, 3].map((place) => answerAt(typed, place).trim()).filter(Boolean) } : null
}

/** What was typed, a space for one that was emptied, else the usual answer. */
function answerAt(typed: Typed, place: number): string {
  const text = typed[`answer.${place}`]
  return text === undefined || text === '' ? (answers[place] ?? '') : text === ' ' ? '' : text
}

function sentence(text: string): string {
  return text === '' || /[.!?]$/.test(text) ? text : `${text}.`
}
