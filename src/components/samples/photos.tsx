import type * as z from 'zod'
import type { FileInJob } from '../../../shared/api/jobs.ts'
import { filePicture, fileAddress } from '../../api/people.ts'
import { When } from '../ui/when.tsx'

/** Photos of a sample as it came; each opens the original. */
export function Photos({ photos, zone }: { photos: readonly z.infer<typeof FileInJob>[]; zone: string }) {
  if (photos.length === 0) return <p className="text-quiet">No photos were taken.</p>
  return (
    <ul className="grid grid-cols-[repeat(auto-fill,minmax(132px,1fr))] gap-3">
      {photos.map(({ id, name, at }) => (
        <li key={id}>
          <a href={fileAddress(id)} className="block"><img src={filePicture(id)} alt={name} loading="lazy" className="aspect-4/3 w-full border border-line object-cover" /></a>
          <span className="text-13 text-quiet"><When at={at} show="both" day="short" zone={zone} /></span>
        </li>
      ))}
    </ul>
  )
}
