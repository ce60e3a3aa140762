import type { Router } from 'express'
import * as people from '../../shared/api/people.ts'
import { route } from '../http/route.ts'
import { listCustomers } from '../services/customers/list-customers.ts'
import { disablePerson } from '../services/people/disable-person.ts'
import { grantAuthorisation } from '../services/people/grant-authorisation.ts'
import { invitePerson } from '../services/people/invite-person.ts'
import { listPeople } from '../services/people/list-people.ts'

export function peopleRoutes(router: Router): void {
  route(router, people.listPeople, ({ query }, caller) => listPeople(query, caller))
  route(router, people.invitePerson, ({ body }, caller) => invitePerson(body, caller))
  route(router, people.disablePerson, ({ params, body }, caller) => disablePerson(params.personId, body.version, caller))
  route(router, people.grantAuthorisation, ({ params, body }, caller) => grantAuthorisation(params.personId, body, caller))
  route(router, people.listCustomers, (_input, caller) => listCustomers(caller))
}
