import type { Caller } from '../../../caller.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { Person } from '../../../models/people/person.ts'

/** Notes that a person signed out; their session is ended by who keeps it. */
export async function signOut(caller: Caller): Promise<void> {
  await inTransaction(caller, async (tx) => {
    const person = await Person.findByPk(caller.person.id, { attributes: ['id', 'siteId', 'customerId'], raw: true, transaction: tx })
    tx.record({ type: 'person.signed-out', id: caller.person.id, siteId: person?.siteId, customerId: person?.customerId })
  })
}
