import { Op, type WhereOptions } from 'sequelize'
import type * as z from 'zod'
import type { listPeople as endpoint } from '../../../shared/api/people.ts'
import type { Caller } from '../../caller.ts'
import { accessibleWhere } from '../../models/accessible.ts'
import { Person } from '../../models/people/person.ts'
import { personViews } from './person-views.ts'

/** The people the caller may see, in the order they came. */
export async function listPeople({ after, limit, role, search }: z.infer<typeof endpoint.query>, caller: Caller): Promise<z.infer<typeof endpoint.response>> {
  const allowed = accessibleWhere(caller.ability, 'read', 'Person')
  if (!allowed) return { items: [], next: null }
  const wanted: WhereOptions[] = [allowed]
  if (role) wanted.push({ role })
  if (search?.trim()) wanted.push({ [Op.or]: [{ name: containing(search) }, { email: containing(search) }] })
  if (after) wanted.push({ id: { [Op.gt]: after } })
  const rows = await Person.findAll({ where: { [Op.and]: wanted }, order: ['id'], limit: limit + 1, raw: true })
  const people = rows.slice(0, limit)
  return { items: await personViews(people), next: rows.length > limit ? (people.at(-1)?.id ?? null) : null }
}

const containing = (text: string) => ({ [Op.iLike]: `%${text.trim().replace(/[\\%_]/g, (sign) => `\\${sign}`)}%` })
