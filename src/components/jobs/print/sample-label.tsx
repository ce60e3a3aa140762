import type * as z from 'zod'
import type { readLabels } from '../../../../shared/api/jobs.ts'
import { CodePicture } from './code-picture.tsx'

type Labels = z.infer<typeof readLabels.response>

/** A label of 62 × 29 mm: the code for the scanner, and for the eye what tells this sample from the others. Always ink on white, as it is printed. */
export function SampleLabel({ label: { number, code, heat, lot, material, size, tests }, customerName }: { label: Labels['labels'][number]; customerName: string }) {
  return (
    <article aria-label={`Label of sample ${number}`} data-theme="light" className="grid h-[29mm] w-[62mm] grid-cols-[21mm_minmax(0,1fr)] items-center gap-[1.5mm] overflow-hidden border border-line bg-sheet p-[2mm] text-ink [break-inside:avoid]">
      <CodePicture svg={code} label={`Code of ${number}`} className="size-[21mm]" />
      <div className="min-w-0 text-[2.7mm]/[3.4mm]">
        <p className="mono text-[3.9mm]/[4.8mm] font-medium whitespace-nowrap">{number}</p>
        <p className="truncate">{heat && <>heat <b className="mono">{heat}</b></>}{heat && lot && ', '}{lot && <>lot <b className="mono">{lot}</b></>}</p>
        <p className="truncate">{[material, size].filter(Boolean).join(', ')}</p>
        <p className="line-clamp-2">{tests.join(', ')}</p>
        <p className="truncate">{customerName}</p>
      </div>
    </article>
  )
}
