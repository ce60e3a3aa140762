import { useState } from 'react'
import type { Hold } from '../../../../shared/api/jobs.ts'
import { useAnswerHold, useReleaseHold } from '../../../api/jobs.ts'
import { useMay } from '../../../api/session.ts'
import { refusalWords, refusedField } from '../../../lib/refused-field.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { Note } from '../../ui/feedback/note.tsx'
import { FieldError } from '../../ui/fields/field.tsx'
import { RadioGroup } from '../../ui/fields/radio-group.tsx'
import { TextField } from '../../ui/fields/text-field.tsx'
import { When } from '../../ui/when.tsx'

const ownWords = '…'

/** A hold with its question: to answer for the customer, to release for the lab, to read for others. */
export function HoldQuestion({ hold, zone }: { hold: Hold; zone: string }) {
  const may = useMay()
  const { sampleNumber, reason, question, answer, placedAt, answeredAt } = hold
  const what = sampleNumber ? `Sample ${sampleNumber.slice(-2)} cannot go on.` : 'This job cannot go on.'
  return (
    <Note kind="warn" className="mb-4 px-4! py-3.5!" title={what}>
      {reason} {question}
      <p className="text-13 text-quiet">on hold since <When at={placedAt} show="both" zone={zone} /></p>
      {answer !== null && <p className="mt-2"><b>Answer:</b> {answer}{answeredAt && <span className="ml-2 text-13 text-quiet"><When at={answeredAt} show="both" zone={zone} /></span>}</p>}
      {may('answer', 'Hold') && (answer === null ? <Answer hold={hold} /> : <p className="mt-1 text-13">The lab has your answer and goes on from it.</p>)}
      {may('receive', 'Hold') && <Release hold={hold} />}
    </Note>
  )
}

function Answer({ hold }: { hold: Hold }) {
  const send = useAnswerHold()
  const [chosen, setChosen] = useState<string | undefined>(hold.answers.length === 0 ? ownWords : undefined)
  const [words, setWords] = useState('')
  const [asked, setAsked] = useState(false)
  const answer = chosen === ownWords ? words.trim() : chosen ?? ''
  const submit = () => {
    setAsked(true)
    if (answer) send.mutate({ holdId: hold.id, version: hold.version, answer })
  }
  return (
    <form className="mt-2.5 flex flex-wrap items-center gap-x-6 gap-y-3 max-tablet:flex-col max-tablet:items-stretch" onSubmit={(event) => { event.preventDefault(); submit() }}>
      <RadioGroup
        legend="Your answer" legendHidden across value={chosen} onValue={setChosen} error={asked && !chosen ? 'Choose an answer, or write your own.' : undefined}
        choices={[...hold.answers.map((value) => ({ value, label: value })), { value: ownWords, label: hold.answers.length > 0 ? 'something else' : 'in your own words' }]}
      />
      {chosen === ownWords && (
        <TextField
          className="min-w-72 flex-1 max-tablet:min-w-0" label="Your answer in your own words" labelHidden placeholder="Your answer" maxLength={1000} value={words} onChange={(event) => setWords(event.target.value)}
          error={refusedField(send.error, 'answer') ?? (asked && !answer ? 'Write your answer first.' : undefined)}
        />
      )}
      <Button kind="main" type="submit" size="tiny" className="max-tablet:min-h-touch" busy={send.isPending}>Send answer</Button>
      {refusalWords(send.error, ['answer']) && <FieldError>{refusalWords(send.error, ['answer'])}</FieldError>}
    </form>
  )
}

function Release({ hold }: { hold: Hold }) {
  const release = useReleaseHold()
  const [remark, setRemark] = useState('')
  return (
    <form className="mt-3 flex flex-wrap items-end gap-2" onSubmit={(event) => { event.preventDefault(); release.mutate({ holdId: hold.id, version: hold.version, remark: remark.trim() }) }}>
      <TextField className="min-w-60 flex-1" label="Remark" aside="if any" maxLength={1000} value={remark} onChange={(event) => setRemark(event.target.value)} />
      <Button type="submit" busy={release.isPending}>Release the hold</Button>
      {hold.answer === null && <p className="basis-full text-13">The customer has not answered yet.</p>}
      {release.error && <div className="basis-full"><FieldError>{refusalWords(release.error)}</FieldError></div>}
    </form>
  )
}
