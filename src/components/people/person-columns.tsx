import { Link } from 'react-router-dom'
import type { Person } from '../../../shared/api/people.ts'
import { Role } from '../../../shared/api/words.ts'
import type { Column } from '../ui/table/column.ts'
import { Two } from '../ui/table/two.tsx'
import { When } from '../ui/when.tsx'
import { AuthorisationList } from './authorisation-list.tsx'
import { capital } from './capital.ts'
import { placeWords } from './place-words.ts'

const states: Record<Person['state'], string> = { invited: 'invited, not here yet', active: 'active', disabled: 'access ended' }

export function personColumns(to: (personId: string) => string): Column<Person>[] {
  return [
    { id: 'name', head: 'Name', card: 'start', filter: { kind: 'text', words: 'name or address' }, cell: (person) => <><Link to={to(person.id)} className="font-medium">{person.name}</Link><Two>{person.email}</Two></> },
    { id: 'role', head: 'Role', card: 'end', nowrap: true, filter: { kind: 'choice', all: 'all', choices: Role.options.map((value) => ({ value, label: capital(value) })) }, cell: ({ role }) => capital(role) },
    { id: 'place', head: 'Site or customer', card: 'foot-start', cell: placeWords },
    { id: 'state', head: 'State', card: 'foot-end', nowrap: true, cell: ({ state }) => <span className={state === 'active' ? undefined : 'text-quiet'}>{states[state]}</span> },
    { id: 'authorised', head: 'Authorised for', share: 30, card: 'wide', cell: ({ authorisations }) => <AuthorisationList authorisations={authorisations} /> },
    { id: 'seen', head: 'Last sign-in', nowrap: true, card: 'none', cell: ({ lastSignInAt }) => (lastSignInAt ? <When at={lastSignInAt} show="both" day="short" /> : <span className="text-quiet">never</span>) },
  ]
}
