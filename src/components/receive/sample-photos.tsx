import { useState } from 'react'
import { downloadFile, largestFile } from '../../../shared/api/files.ts'
import type { Sample } from '../../../shared/api/samples.ts'
import { useAddPhoto } from '../../api/samples.ts'
import { addressOf } from '../../lib/call.ts'
import { FileField, type FileShown } from '../ui/fields/file-field.tsx'

/** Photos of the sample as it came; on a phone the camera opens. They are sent at once. */
export function SamplePhotos({ sample }: { sample: Pick<Sample, 'id' | 'photos'> }) {
  const add = useAddPhoto(sample.id)
  const [going, setGoing] = useState<readonly FileShown[]>([])
  const send = (file: File) => {
    const id = `${file.name}-${file.lastModified}-${file.size}`
    const show = (change: Partial<FileShown>) => setGoing((all) => [...all.filter((one) => one.id !== id), { id, name: file.name, bytes: file.size, percent: 0, ...change }])
    show({})
    add.mutate({ file, onProgress: (share) => show({ percent: share * 100 }) }, { onSuccess: () => setGoing((all) => all.filter((one) => one.id !== id)), onError: (error) => show({ error: error.message }) })
  }
  return (
    <div>
      <p className="mb-1 text-13 font-medium">Photos</p>
      {sample.photos.length > 0 && (
        <ul className="mb-2 flex flex-wrap gap-2">
          {sample.photos.map(({ id, name }) => (
            <li key={id}><a href={addressOf(downloadFile, { fileId: id }, { as: 'original' })}><img src={addressOf(downloadFile, { fileId: id }, { as: 'display' })} alt={`Photo ${name}`} className="size-20 border border-line object-cover" /></a></li>
          ))}
        </ul>
      )}
      <FileField label="Drop a photo here" action="take or choose one" accept="image/*" maxBytes={largestFile} many files={going} onFiles={(files) => files.forEach(send)} onRemove={(id) => setGoing((all) => all.filter((one) => one.id !== id))} className="[&>label]:p-3!" />
    </div>
  )
}
