import { useState } from 'react'
import type { Job } from '../../../../shared/api/jobs.ts'
import { useWriteMessage } from '../../../api/jobs.ts'
import { useMay } from '../../../api/session.ts'
import { fileAddress } from '../../../api/people.ts'
import { refusalWords, refusedField } from '../../../lib/refused-field.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { FieldError } from '../../ui/fields/field.tsx'
import { TextArea } from '../../ui/fields/text-area.tsx'
import { Icon } from '../../ui/icon.tsx'
import { SideSection } from '../../ui/side-section.tsx'
import { When } from '../../ui/when.tsx'

const lastFew = 4

/** What customer and lab wrote each other about the job, and a box to write in. */
export function Messages({ job }: { job: Job }) {
  const [all, setAll] = useState(false)
  const mayWrite = useMay()('create', 'Message')
  const shown = all ? job.messages : job.messages.slice(-lastFew)
  return (
    <SideSection title="Messages" aside={job.messages.length > shown.length && <button type="button" className="underline underline-offset-3" onClick={() => setAll(true)}>All {job.messages.length}</button>}>
      {shown.length === 0 && <p className="mb-4 text-quiet">Nothing was written yet.</p>}
      <ol className="mb-4 grid gap-4">
        {shown.map(({ id, by, mine, text, at, files }) => (
          <li key={id} className={mine ? 'border-l-2 border-line pl-3.5' : undefined}>
            <p className="flex justify-between gap-3 text-13 font-medium">{mine ? 'You' : by}<When at={at} show="both" zone={job.timeZone} className="font-normal text-quiet" /></p>
            <p className="wrap-break-word whitespace-pre-wrap">{text}</p>
            {files.map((file) => <a key={file.id} href={fileAddress(file.id)} className="mt-1 inline-flex items-center gap-1.5 text-13"><Icon name="attach" />{file.name}</a>)}
          </li>
        ))}
      </ol>
      {mayWrite && <Write jobId={job.id} />}
    </SideSection>
  )
}

function Write({ jobId }: { jobId: string }) {
  const [text, setText] = useState('')
  const write = useWriteMessage(jobId)
  const send = () => {
    if (text.trim()) write.mutate({ text: text.trim() }, { onSuccess: () => setText('') })
  }
  return (
    <form onSubmit={(event) => { event.preventDefault(); send() }}>
      <div className="grid grid-cols-[minmax(0,1fr)_auto] items-start gap-2">
        <TextArea
          label="Message" labelHidden rows={1} maxLength={2000} placeholder="Write a message" value={text} error={refusedField(write.error, 'text')}
          onChange={(event) => setText(event.target.value)} onKeyDown={(event) => { if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) send() }}
        />
        <Button type="submit" busy={write.isPending}>Send</Button>
      </div>
      {refusalWords(write.error, ['text']) && <FieldError>{refusalWords(write.error, ['text'])}</FieldError>}
    </form>
  )
}
