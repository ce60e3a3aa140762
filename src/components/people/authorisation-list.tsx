import type { Authorisation } from '../../../shared/api/people.ts'
import { calendarDay, formatDay } from '../../lib/format.ts'

type Line = { methodTitle: string; until: string; rights: string[] }

/** Rights of one method that end on the same day share a line: "Tensile: carry out, review until 31 Aug 2028". */
export function AuthorisationList({ authorisations, full = false }: { authorisations: readonly Authorisation[]; full?: boolean }) {
  const today = calendarDay(new Date())
  const lines: Line[] = []
  for (const { methodTitle, until, right } of authorisations) {
    const same = lines.find((line) => line.methodTitle === methodTitle && line.until === until)
    if (same) same.rights.push(right)
    else lines.push({ methodTitle, until, rights: [right] })
  }
  if (lines.length === 0) return <span className="text-quiet">{full ? 'Nothing yet.' : '–'}</span>
  return (
    <ul className={full ? 'grid gap-1.5' : 'text-13'}>
      {lines.map(({ methodTitle, until, rights }) => (
        <li key={`${methodTitle}${until}`}>
          {methodTitle}: {rights.join(', ')} <span className={`whitespace-nowrap ${until < today ? 'font-medium text-red' : 'text-quiet'}`}>{until < today ? 'ended' : 'until'} {formatDay(until, 'full')}</span>
        </li>
      ))}
    </ul>
  )
}
