import type { Customer } from '../../../server/models/people/customer.ts'
import type { Person } from '../../../server/models/people/person.ts'
import type { Site } from '../../../server/models/sites/site.ts'
import { buildCustomer } from './customers.ts'
import { buildPerson } from './people.ts'
import { buildCompany, buildSite } from './sites.ts'

export type House = { site: Site; customer: Customer; client: Person; technician: Person; manager: Person }

/** A site and a customer of a test's own with one person of each role; the manager has this site only. */
export async function buildHouse(): Promise<House> {
  await buildCompany()
  const site = await buildSite()
  const customer = await buildCustomer()
  return {
    site, customer,
    client: await buildPerson({ role: 'client', customerId: customer.id }),
    technician: await buildPerson({ role: 'technician', siteId: site.id }),
    manager: await buildPerson({ role: 'manager', siteId: site.id }),
  }
}
