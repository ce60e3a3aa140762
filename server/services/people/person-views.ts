import { type Transaction } from 'sequelize'
import type { Person as PersonView } from '../../../shared/api/people.ts'
import { methodOf } from '../../../shared/methods.ts'
import { Authorisation } from '../../models/people/authorisation.ts'
import { Customer } from '../../models/people/customer.ts'
import type { Person } from '../../models/people/person.ts'
import { Site } from '../../models/sites/site.ts'

/** People with their place and their authorisations, in three queries however many they are. */
export async function personViews(people: readonly Person[], transaction?: Transaction): Promise<PersonView[]> {
  const sites = await Site.findAll({ where: { id: distinct(people.map((person) => person.siteId)) }, raw: true, transaction })
  const customers = await Customer.findAll({ where: { id: distinct(people.map((person) => person.customerId)) }, raw: true, transaction })
  const authorisations = await Authorisation.findAll({ where: { personId: people.map((person) => person.id) }, order: ['methodId', 'right'], raw: true, transaction })
  return people.map(({ id, name, email, role, siteId, customerId, state, version, lastSignInAt }) => ({
    id, name, email, role, siteId, customerId, state, version,
    siteName: sites.find((site) => site.id === siteId)?.name ?? null,
    customerName: customers.find((customer) => customer.id === customerId)?.name ?? null,
    lastSignInAt: lastSignInAt?.toISOString() ?? null,
    authorisations: authorisations.filter((one) => one.personId === id).map(authorisationView),
  }))
}

export async function personView(person: Person, transaction?: Transaction): Promise<PersonView> {
  const [view] = await personViews([person], transaction)
  if (!view) throw new Error('one person in, none out')
  return view
}

function authorisationView({ id, personId, methodId, right, until }: Authorisation): PersonView['authorisations'][number] {
  return { id, personId, methodId, methodTitle: methodOf(methodId)?.title ?? methodId, right, until }
}

const distinct = (ids: readonly (string | null)[]): string[] => [...new Set(ids.filter((id) => id !== null))]
