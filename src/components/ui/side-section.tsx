import { useId, type ReactNode } from 'react'
import { SectionHead } from './section-head.tsx'

/** A section of the side column, or of a page: head and content, named for those who listen. */
export function SideSection({ title, aside, children, className = 'mb-9' }: { title: ReactNode; aside?: ReactNode; children: ReactNode; className?: string }) {
  const id = useId()
  return (
    <section aria-labelledby={id} className={className}>
      <SectionHead id={id} title={title} aside={aside} />
      {children}
    </section>
  )
}
