import { randomUUID } from 'node:crypto'
import { Person } from '../../../server/models/people/person.ts'
import { hashPassword } from '../../../server/services/people/password/hash-password.ts'
import type { Role } from '../../../shared/api/words.ts'

/** The password of every person that tests build. */
export const testPassword = 'seven blue anvils at noon'
let passwordHash: Promise<string> | undefined

type Wanted = { role: Role; siteId?: string | null; customerId?: string | null; name?: string; email?: string; state?: Person['state'] }

/** A person who may sign in with `testPassword`. */
export async function buildPerson({ role, siteId = null, customerId = null, name, email, state = 'active' }: Wanted): Promise<Person> {
  const mark = randomUUID().slice(0, 8)
  passwordHash ??= hashPassword(testPassword)
  const person = await Person.create({ role, siteId, customerId, state, name: name ?? `Robin ${mark}`, email: email ?? `robin.${mark}@people.example`, passwordHash: state === 'invited' ? null : await passwordHash })
  return person.get({ plain: true })
}
