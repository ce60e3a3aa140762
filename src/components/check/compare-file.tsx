import { useState } from 'react'
import { formatBytes } from '../../lib/format.ts'
import { FileField } from '../ui/fields/file-field.tsx'
import { SideSection } from '../ui/side-section.tsx'
import { BigAnswer } from './big-answer.tsx'
import { fingerprint, grouped } from './fingerprint.ts'

type Compared = { name: string; bytes: number; sha256: string }

/** Larger than any report; a film dropped by mistake would fill the memory of a phone. */
const mostBytes = 100_000_000

/** Holds a file against the fingerprint on record. The file is read in the browser only. */
export function CompareFile({ onRecord }: { onRecord: string }) {
  const [compared, setCompared] = useState<Compared>()
  const [busy, setBusy] = useState(false)
  const [failed, setFailed] = useState<string>()
  const take = async (file: File) => {
    setBusy(true)
    setFailed(undefined)
    setCompared(undefined)
    try {
      setCompared({ name: file.name, bytes: file.size, sha256: await fingerprint(file) })
    } catch {
      setFailed('This browser could not work out the fingerprint. Open the page over https, or compare the SHA-256 below with a tool of your own.')
    } finally {
      setBusy(false)
    }
  }
  const isSame = compared?.sha256 === onRecord
  return (
    <SideSection title="Is your file this report, unchanged?">
      <FileField
        label={busy ? 'Reading the file' : 'Drop the PDF here'} hint="Its fingerprint is worked out in your browser. The file does not leave this device."
        maxBytes={mostBytes} error={failed} onFiles={([file]) => file && void take(file)}
      />
      <div aria-live="polite">
        {compared && (
          <div className="mt-6 mb-2">
            <BigAnswer small look={isSame ? 'good' : 'bad'} icon={isSame ? 'check' : 'cross'} title={isSame ? 'The same, to the last byte' : 'Not the same'}>
              <b className="break-words">{compared.name}</b>, {formatBytes(compared.bytes)}, {isSame ? 'is the file that was issued.' : 'differs from the file that was issued. It was changed after it was signed, saved anew by a program, or is another revision.'}
            </BigAnswer>
          </div>
        )}
      </div>
      <dl className="mt-3 grid gap-1.5 text-13">
        <Print name="SHA-256 on record" value={onRecord} />
        {compared && <Print name="SHA-256 of your file" value={compared.sha256} />}
      </dl>
    </SideSection>
  )
}

function Print({ name, value }: { name: string; value: string }) {
  return (
    <div className="flex flex-wrap justify-between gap-x-4 gap-y-1">
      <dt className="text-quiet">{name}</dt>
      <dd className="mono break-words">{grouped(value)}</dd>
    </div>
  )
}
