import type { Person as PersonView } from '../../../shared/api/people.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { loadOne, must, mustBeCurrent } from '../../models/load.ts'
import { Link } from '../../models/people/link.ts'
import { Person } from '../../models/people/person.ts'
import { personView } from './person-views.ts'
import { endSessions } from './session/end-sessions.ts'

/** Ends a person's access at once: sessions, open links and sign-in. What they did stays under their name. */
export async function disablePerson(personId: string, version: number, caller: Caller): Promise<PersonView> {
  return inTransaction(caller, async (tx) => {
    const person = await loadOne(Person, 'Person', personId, caller, { tx, lock: true })
    const { role, siteId, customerId } = person
    must(caller, 'manage', 'Person', { id: person.id, role, siteId: siteId ?? undefined, customerId: customerId ?? undefined })
    if (person.id === caller.person.id) throw new Problem('not-now', 'you cannot end your own access; ask another manager')
    mustBeCurrent(person, version, 'This person')
    if (person.state === 'disabled') throw new Problem('not-now', 'this person\'s access has ended already')
    const change = { state: 'disabled' as const, sessionEpoch: person.sessionEpoch + 1, version: person.version + 1 }
    await Person.update(change, { where: { id: person.id }, transaction: tx })
    await Link.update({ usedAt: new Date() }, { where: { personId: person.id, usedAt: null }, transaction: tx })
    await endSessions(person.id, tx)
    tx.record({ type: 'person.disabled', id: person.id, siteId, customerId })
    return personView({ ...person, ...change }, tx)
  })
}
