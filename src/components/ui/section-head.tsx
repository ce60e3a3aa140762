import type { ReactNode } from 'react'

/** An ink line, a bold head, and something quiet at the right (a count, a link, `<Live/>`). */
export function SectionHead({ title, aside, level = 2, id }: { title: ReactNode; aside?: ReactNode; level?: 2 | 3; id?: string }) {
  const Head = level === 2 ? 'h2' : 'h3'
  return (
    <div className="mb-3 flex items-baseline justify-between gap-4 border-t border-ink pt-2">
      <Head id={id} className="text-15 font-bold">{title}</Head>
      {aside && <span className="text-right text-13 text-quiet">{aside}</span>}
    </div>
  )
}
