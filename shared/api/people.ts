import * as z from 'zod'
import { Day, Email, Id, Instant, page, PageById, Text, Version } from './basics.ts'
import { endpoint } from './endpoint.ts'
import { Right, Role } from './words.ts'

export const Authorisation = z.object({ id: Id, personId: Id, methodId: z.string(), methodTitle: z.string(), right: Right, until: Day })
export type Authorisation = z.infer<typeof Authorisation>

export const Person = z.object({
  id: Id, name: z.string(), email: z.string(), role: Role, siteId: Id.nullable(), siteName: z.string().nullable(),
  customerId: Id.nullable(), customerName: z.string().nullable(), state: z.enum(['invited', 'active', 'disabled']), version: Version,
  lastSignInAt: Instant.nullable(), authorisations: z.array(Authorisation),
})
export type Person = z.infer<typeof Person>

export const listPeople = endpoint({
  method: 'get', path: '/people', can: ['read', 'Person'],
  query: z.strictObject({ ...PageById, role: Role.optional(), search: z.string().max(100).optional() }), response: page(Person),
})

/** Colleagues at a site are invited by its manager, clients for their organisation. */
export const InvitePerson = z.strictObject({ name: Text(100), email: Email, role: Role, siteId: Id.nullable(), customerId: Id.nullable() })
export const invitePerson = endpoint({ method: 'post', path: '/people', can: ['manage', 'Person'], body: InvitePerson, response: Person })
export const disablePerson = endpoint({
  method: 'post', path: '/people/:personId/disable', can: ['manage', 'Person'], params: z.strictObject({ personId: Id }),
  body: z.strictObject({ version: Version }), response: Person,
})
export const grantAuthorisation = endpoint({
  method: 'post', path: '/people/:personId/authorisations', can: ['manage', 'Authorisation'], params: z.strictObject({ personId: Id }),
  body: z.strictObject({ methodId: Text(60), right: Right, until: Day, evidence: Text(500) }), response: Person,
})

export const Customer = z.object({ id: Id, name: z.string(), address: z.string(), reportEmail: z.string(), currency: z.string() })
export type Customer = z.infer<typeof Customer>
export const listCustomers = endpoint({ method: 'get', path: '/customers', can: ['read', 'Customer'], response: z.object({ items: z.array(Customer) }) })

export const peopleEndpoints = [listPeople, invitePerson, disablePerson, grantAuthorisation, listCustomers]
