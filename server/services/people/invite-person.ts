import { UniqueConstraintError } from 'sequelize'
import type * as z from 'zod'
import { placeOf } from '../../../shared/access/place-of.ts'
import type { InvitePerson, Person as PersonView } from '../../../shared/api/people.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction, type Tx } from '../../database/transaction.ts'
import { must } from '../../models/load.ts'
import { Customer } from '../../models/people/customer.ts'
import { Person } from '../../models/people/person.ts'
import { Site } from '../../models/sites/site.ts'
import { makeLink } from './links/make-link.ts'
import { personView } from './person-views.ts'

type Invitation = z.infer<typeof InvitePerson>

/** Adds a person who chooses their password by a mailed link. Asked again for who has not come yet, the link is made anew. */
export async function invitePerson(invitation: Invitation, caller: Caller): Promise<PersonView> {
  const { role, siteId, customerId } = invitation
  mustFitRole(invitation)
  must(caller, 'manage', 'Person', { role, siteId: siteId ?? undefined, customerId: customerId ?? undefined })
  try {
    return await inTransaction(caller, async (tx) => {
      await mustExist(invitation, tx)
      const person = await invitedPerson(invitation, tx)
      const linkId = await makeLink(person.id, 'invitation', tx)
      tx.record({ type: 'person.invited', id: person.id, siteId, customerId, data: { linkId, role } })
      return personView(person, tx)
    })
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw taken()
    throw error
  }
}

async function invitedPerson({ name, email, role, siteId, customerId }: Invitation, tx: Tx): Promise<Person> {
  const known = await Person.findOne({ where: { email }, raw: true, transaction: tx, lock: tx.LOCK.UPDATE })
  if (!known) return (await Person.create({ name, email, role, siteId, customerId, state: 'invited' }, { transaction: tx })).get({ plain: true })
  if (known.state !== 'invited' || known.role !== role || known.siteId !== siteId || known.customerId !== customerId) throw taken()
  await Person.update({ name, version: known.version + 1 }, { where: { id: known.id }, transaction: tx })
  return { ...known, name, version: known.version + 1 }
}

const taken = () => new Problem('not-acceptable', 'this address has an account already', { email: 'has an account already' })

function mustFitRole({ role, siteId, customerId }: Invitation): void {
  const place = placeOf(role)
  const fields: Record<string, string> = {}
  if (place === 'customer' && customerId === null) fields.customerId = 'choose the organisation this person belongs to'
  if (place === 'customer' && siteId !== null) fields.siteId = 'a customer\'s person belongs to no site'
  if (place !== 'customer' && customerId !== null) fields.customerId = 'only a customer\'s person belongs to an organisation'
  if (place === 'site' && siteId === null) fields.siteId = 'choose the site this person works at'
  if (Object.keys(fields).length > 0) throw new Problem('not-acceptable', 'role and place do not fit together', fields)
}

async function mustExist({ siteId, customerId }: Invitation, tx: Tx): Promise<void> {
  if (customerId !== null && !(await Customer.findByPk(customerId, { raw: true, transaction: tx }))) throw new Problem('not-acceptable', 'there is no such customer', { customerId: 'there is no such customer' })
  if (siteId !== null && !(await Site.findByPk(siteId, { raw: true, transaction: tx }))) throw new Problem('not-acceptable', 'there is no such site', { siteId: 'there is no such site' })
}
