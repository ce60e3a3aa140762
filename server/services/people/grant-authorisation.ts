import type * as z from 'zod'
import type { grantAuthorisation as endpoint, Person as PersonView } from '../../../shared/api/people.ts'
import { methodOf } from '../../../shared/methods.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { loadOne, must } from '../../models/load.ts'
import { Authorisation } from '../../models/people/authorisation.ts'
import { Person } from '../../models/people/person.ts'
import { personView } from './person-views.ts'

const yearsAtMost = 5

/** Lets a person carry out, review or sign for a method until a day; granting it again sets the new day and evidence. */
export async function grantAuthorisation(personId: string, { methodId, right, until, evidence }: z.infer<typeof endpoint.body>, caller: Caller): Promise<PersonView> {
  if (!methodOf(methodId)) throw new Problem('not-acceptable', 'there is no such method', { methodId: 'there is no such method' })
  mustBeUsable(until)
  return inTransaction(caller, async (tx) => {
    const person = await loadOne(Person, 'Person', personId, caller, { tx, lock: true })
    const { siteId } = person
    must(caller, 'manage', 'Authorisation', { siteId: siteId ?? undefined })
    if (siteId === null) throw new Problem('not-acceptable', 'only people of a site are authorised')
    if (person.state === 'disabled') throw new Problem('not-now', 'this person\'s access has ended')
    const known = await Authorisation.findOne({ where: { personId, methodId, right }, raw: true, transaction: tx })
    const { id } = known ?? (await Authorisation.create({ personId, siteId, methodId, right, until, evidence }, { transaction: tx }))
    if (known) await Authorisation.update({ siteId, until, evidence }, { where: { id }, transaction: tx })
    tx.record({ type: 'authorisation.granted', id, siteId, data: { personId, methodId, right, until, evidence }, touches: [{ subject: 'Person', id: personId }] })
    return personView(person, tx)
  })
}

/** Days compare as text. Yesterday is let through for sites whose day has not ended, and so that a right can be ended. */
function mustBeUsable(until: string): void {
  const dayFromNow = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10)
  if (until < dayFromNow(-1)) throw new Problem('not-acceptable', 'the last day has passed', { until: 'has passed' })
  if (until > dayFromNow(yearsAtMost * 366)) throw new Problem('not-acceptable', 'the last day is too far away', { until: `at most ${yearsAtMost} years from now` })
}
