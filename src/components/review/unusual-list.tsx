import { Note } from '../ui/feedback/note.tsx'
import { Icon } from '../ui/icon.tsx'
import { SideSection } from '../ui/side-section.tsx'
import type { LookedOver } from './look-over.ts'

/** A reviewer starts from what is unusual; what was looked at and found in order is listed once, small. */
export function UnusualList({ unusual, inOrder }: LookedOver) {
  const odd = unusual.filter(({ kind }) => kind !== 'plain').length
  return (
    <SideSection className="mb-6" title="What is unusual about it" aside={`${odd} of ${unusual.length + inOrder.length} things looked at`}>
      {odd === 0 && <p className="mb-2.5 font-medium">Nothing.</p>}
      <div className="grid gap-2.5">
        {unusual.map(({ kind, title, text, list }, place) => (
          <Note key={place} kind={kind} title={title}>
            {text}
            {list && list.length > 0 && <ul className="mt-1 list-disc pl-4">{list.map((line, at) => <li key={at}>{line}</li>)}</ul>}
          </Note>
        ))}
      </div>
      <ul className="mt-2.5 flex flex-wrap gap-x-5 gap-y-1 text-13 text-quiet">
        {inOrder.map((line) => <li key={line} className="inline-flex items-center gap-1.5"><Icon name="check" className="size-3.25!" />{line}</li>)}
      </ul>
    </SideSection>
  )
}
