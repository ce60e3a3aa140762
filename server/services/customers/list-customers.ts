import type * as z from 'zod'
import type { listCustomers as endpoint } from '../../../shared/api/people.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Customer } from '../../models/people/customer.ts'

/** The customers the caller may see, by name. */
export async function listCustomers(caller: Caller): Promise<z.infer<typeof endpoint.response>> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Customer')
  return { items: allowed ? await Customer.findAll({ where: allowed, order: ['name'], raw: true }) : [] }
}
