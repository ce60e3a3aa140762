import { useId, useRef, useState, type DragEvent, type ReactNode } from 'react'
import { formatBytes } from '../../../lib/format.ts'
import { IconButton } from '../buttons/icon-button.tsx'
import { classNames } from '../class-names.ts'
import { Meter } from '../feedback/meter.tsx'
import { Icon } from '../icon.tsx'
import { FieldError } from './field.tsx'

/** A file on its way. `percent` undefined means it is there. */
export type FileShown = { id: string; name: string; bytes?: number; percent?: number; error?: string; href?: string }

/**
 * A place to drop or choose files. It sends nothing itself: `onFiles` gets what was taken, `files` shows how far each is.
 * `accept` as in HTML (".csv,text/csv"), `maxBytes` for each; what does not fit is said here and not handed on.
 */
export function FileField({ label, hint, action, accept, maxBytes, many = false, files = [], onFiles, onRemove, error, className }: {
  /** "Drop the PDF here" */
  label: ReactNode
  hint?: ReactNode
  /** The underlined words beside it. */
  action?: string
  accept?: string
  maxBytes?: number
  many?: boolean
  files?: readonly FileShown[]
  onFiles: (files: File[]) => void
  onRemove?: (id: string) => void
  error?: string | undefined
  className?: string
}) {
  const id = useId()
  const input = useRef<HTMLInputElement>(null)
  const [over, setOver] = useState(false)
  const [refused, setRefused] = useState<string>()
  const take = (list: FileList | null) => {
    const chosen = [...(list ?? [])].slice(0, many ? undefined : 1)
    const tooLarge = chosen.find((file) => maxBytes !== undefined && file.size > maxBytes)
    const wrongKind = chosen.find((file) => !isAccepted(file, accept))
    setRefused(
      wrongKind ? `${wrongKind.name} is not of a kind that is taken here (${accept ?? ''}).`
      : tooLarge && maxBytes !== undefined ? `${tooLarge.name} has ${formatBytes(tooLarge.size)}; at most ${formatBytes(maxBytes)} are taken.`
      : undefined)
    const fit = chosen.filter((file) => isAccepted(file, accept) && !(maxBytes !== undefined && file.size > maxBytes))
    if (fit.length > 0) onFiles(fit)
    if (input.current) input.current.value = ''
  }
  const drop = (event: DragEvent) => {
    event.preventDefault()
    setOver(false)
    take(event.dataTransfer.files)
  }
  const says = error ?? refused
  return (
    <div className={className}>
      <label
        onDragOver={(event) => {
          event.preventDefault()
          setOver(true)
        }}
        onDragLeave={() => setOver(false)}
        onDrop={drop}
        className={classNames('relative flex cursor-pointer items-center gap-4 rounded border-[1.5px] border-dashed bg-sheet p-6 has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink max-tablet:items-start max-tablet:px-4 max-tablet:py-5', over ? 'border-ink bg-wash' : says ? 'border-red' : 'border-edge')}
      >
        <Icon name="drop" className="size-7!" />
        <span>
          <b>{label}</b> or <u className="underline-offset-3">{action ?? 'choose it'}</u>
          {hint && <small className="mt-0.5 block text-13 text-quiet">{hint}</small>}
        </span>
        <input ref={input} type="file" accept={accept} multiple={many} onChange={(event) => take(event.target.files)} className="sr-only" aria-invalid={says ? true : undefined} aria-describedby={says ? id : undefined} />
      </label>
      {says && <FieldError id={id}>{says}</FieldError>}
      {files.length > 0 && (
        <ul className="mt-3 grid gap-2">
          {files.map((file) => <FileLine key={file.id} file={file} onRemove={onRemove} />)}
        </ul>
      )}
    </div>
  )
}

function FileLine({ file, onRemove }: { file: FileShown; onRemove: ((id: string) => void) | undefined }) {
  const going = file.percent !== undefined && !file.error
  return (
    <li className="flex items-center gap-2.5 text-13">
      <Icon name="attach" className="text-quiet" />
      <span className="min-w-0 flex-1">
        <span className="block truncate">{file.href ? <a href={file.href}>{file.name}</a> : file.name}</span>
        {going && <Meter className="mt-1" percent={file.percent ?? 0} label={`${file.name} on its way`} />}
        {file.error && <span className="text-red">{file.error}</span>}
      </span>
      {file.bytes !== undefined && <span className="whitespace-nowrap text-quiet">{going ? `${Math.round(file.percent ?? 0)} %` : formatBytes(file.bytes)}</span>}
      {onRemove && <IconButton icon="cross" label={`Remove ${file.name}`} onClick={() => onRemove(file.id)} />}
    </li>
  )
}

function isAccepted(file: File, accept: string | undefined): boolean {
  if (!accept) return true
  return accept.split(',').map((kind) => kind.trim().toLowerCase()).some((kind) =>
    kind.startsWith('.') ? file.name.toLowerCase().endsWith(kind)
    : kind.endsWith('/*') ? file.type.startsWith(kind.slice(0, -1))
    : file.type === kind)
}
