import { formatDay, formatTime, formatWhen, type DayStyle } from '../../lib/format.ts'

/**
 * A time for people, with the machine's own inside: `<When at={job.dueOn} />` is "Fri 13 Mar", with `show="both"` "Fri 13 Mar, 16:20".
 * `zone` is the site's; calendar days (`2026-03-13`) are the same everywhere.
 */
export function When({ at, show = 'day', day = 'week', zone, className }: { at: string; show?: 'day' | 'time' | 'both'; day?: DayStyle; zone?: string; className?: string }) {
  const text = show === 'day' ? formatDay(at, day, { zone }) : show === 'time' ? formatTime(at, { zone }) : formatWhen(at, day, { zone })
  return <time dateTime={at} className={`whitespace-nowrap ${className ?? ''}`}>{text}</time>
}
