import type { ReactNode } from 'react'
import { formatTime } from '../../lib/format.ts'

/** The dot that says the page keeps itself up to date: `<Live at={query.dataUpdatedAt} />` is "up to date 10:42". `broken` while the line is down. */
export function Live({ at, zone, broken = false, children }: { at?: number | string | Date; zone?: string; broken?: boolean; children?: ReactNode }) {
  const time = at === undefined || at === 0 ? undefined : formatTime(typeof at === 'number' ? new Date(at) : at, { zone })
  const words = children ?? (broken ? `no connection${time ? ` since ${time}` : ''}` : time ? `up to date ${time}` : 'as it happens')
  return (
    <span className={`inline-flex items-center gap-1.75 text-13 whitespace-nowrap ${broken ? 'text-amber' : 'text-quiet'}`}>
      <i aria-hidden className={`size-1.5 flex-none rounded-full ${broken ? 'border border-current' : 'bg-ink'}`} />
      {words}
    </span>
  )
}
