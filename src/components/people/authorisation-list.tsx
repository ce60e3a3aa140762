import type { Authorisation } from '../../../shared/api/people.ts'
import { calendarDay, formatDay } from '../../lib/format.ts'
import { capital } from './capital.ts'

type Line = { methodTitles: string[]; until: string; rights: string }

/** Methods with the same rights until the same day share a line: "Carry out, review: Rockwell hardness, Tensile until 31 Aug 2028". */
export function AuthorisationList({ authorisations, full = false }: { authorisations: readonly Authorisation[]; full?: boolean }) {
  const today = calendarDay(new Date())
  const lines: Line[] = []
  for (const { methodTitle, until } of authorisations) {
    const rights = authorisations.filter((one) => one.methodTitle === methodTitle && one.until === until).map(({ right }) => right).join(', ')
    const same = lines.find((line) => line.rights === rights && line.until === until)
    if (!same) lines.push({ methodTitles: [methodTitle], until, rights })
    else if (!same.methodTitles.includes(methodTitle)) same.methodTitles.push(methodTitle)
  }
  if (lines.length === 0) return <span className={full ? 'text-quiet' : 'text-quiet max-list:hidden'}>{full ? 'Nothing yet.' : '–'}</span>
  return (
    <ul className={full ? 'grid gap-1.5' : 'text-13'}>
      {lines.map(({ methodTitles, until, rights }) => (
        <li key={`${rights}${until}`}>
          <b>{capital(rights)}:</b> {methodTitles.join(', ')}{' '}
          <span className={`whitespace-nowrap ${until < today ? 'font-medium text-red' : 'text-quiet'}`}>{until < today ? 'ended' : 'until'} {formatDay(until, 'full')}</span>
        </li>
      ))}
    </ul>
  )
}
