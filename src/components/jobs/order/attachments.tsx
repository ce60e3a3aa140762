import { useRef, useState, type DragEvent } from 'react'
import { largestFile } from '../../../../shared/api/files.ts'
import type { Job } from '../../../../shared/api/jobs.ts'
import { useAttachFile, useRemoveFile } from '../../../api/jobs.ts'
import { fileAddress } from '../../../api/people.ts'
import { formatBytes } from '../../../lib/format.ts'
import { Button } from '../../ui/buttons/button.tsx'
import { IconButton } from '../../ui/buttons/icon-button.tsx'
import { classNames } from '../../ui/class-names.ts'
import { Meter } from '../../ui/feedback/meter.tsx'
import { FieldError } from '../../ui/fields/field.tsx'
import { Icon } from '../../ui/icon.tsx'

type OnItsWay = { id: number; name: string; percent: number; error?: string }

/** Drawings and specifications: dropped on the button or chosen, with how far each is. `keep`: what is there stays, as once the job is placed. */
export function Attachments({ job, keep = false, className }: { job: Job; keep?: boolean; className?: string }) {
  const attach = useAttachFile(job.id)
  const remove = useRemoveFile(job.id)
  const input = useRef<HTMLInputElement>(null)
  const next = useRef(0)
  const [over, setOver] = useState(false)
  const [going, setGoing] = useState<readonly OnItsWay[]>([])
  const files = job.files.filter(({ purpose }) => purpose === 'attachment')
  const set = (id: number, change: Partial<OnItsWay> | null) => setGoing((all) => all.flatMap((one) => (one.id !== id ? [one] : change ? [{ ...one, ...change }] : [])))
  const take = (list: FileList | null) => {
    for (const file of list ?? []) {
      const id = next.current++
      const tooLarge = file.size > largestFile
      setGoing((all) => [...all, { id, name: file.name, percent: 0, ...(tooLarge && { error: `has ${formatBytes(file.size)}; at most ${formatBytes(largestFile)} are taken` }) }])
      if (!tooLarge) attach.mutate({ file, onProgress: (share) => set(id, { percent: share * 100 }) }, { onSuccess: () => set(id, null), onError: ({ message }) => set(id, { error: message }) })
    }
    if (input.current) input.current.value = ''
  }
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    take(event.dataTransfer.files)
  }
  return (
    <div className={classNames('min-w-0', className)} onDragOver={(event) => { event.preventDefault(); setOver(true) }} onDragLeave={() => setOver(false)} onDrop={drop}>
      {!keep && <p className="mb-1 flex justify-between text-13 font-medium">Drawings <span className="font-normal text-quiet">if any</span></p>}
      <Button kind="soft" icon="attach" className={classNames('w-full justify-start! px-2.5!', over && 'border-ink bg-wash')} onClick={() => input.current?.click()}>{over ? 'Drop it here' : 'Attach or drop a file'}</Button>
      <input ref={input} type="file" multiple hidden aria-label="Attach files" onChange={(event) => take(event.target.files)} />
      <ul className="grid text-13">
        {files.map(({ id, name, size }) => (
          <li key={id} className="flex items-center gap-2">
            <Icon name="page" className="text-quiet" />
            <a href={fileAddress(id)} className="min-w-0 flex-1 truncate py-2">{name}</a>
            <span className="whitespace-nowrap text-quiet">{formatBytes(size)}</span>
            {!keep && <IconButton icon="cross" label={`Remove ${name}`} onClick={() => remove.mutate(id)} />}
          </li>
        ))}
        {going.map(({ id, name, percent, error }) => (
          <li key={id} className="flex items-center gap-2 py-2">
            <Icon name={error ? 'stop' : 'page'} className={error ? 'text-red' : 'text-quiet'} />
            <span className="min-w-0 flex-1">
              <span className="block truncate">{name}</span>
              {error ? <span role="alert" className="text-red">{error}</span> : <Meter percent={percent} label={`${name} on its way`} className="mt-1" />}
            </span>
            {error && <IconButton icon="cross" label={`Take ${name} off the list`} onClick={() => set(id, null)} />}
          </li>
        ))}
      </ul>
      {remove.error && <FieldError>{remove.error.message}</FieldError>}
    </div>
  )
}
