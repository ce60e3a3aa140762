import type { Person } from '../../server/models/people/person.ts'
import type { Caller } from '../../server/caller.ts'
import { readCaller } from '../../server/http/session/read-caller.ts'

/** A built person as the caller of a use case. */
export async function callerFor(person: Pick<Person, 'id'> & Partial<Pick<Person, 'sessionEpoch'>>): Promise<Caller> {
  const caller = await readCaller(person.id, person.sessionEpoch ?? 0, 'test')
  if (!caller) throw new Error('this person may not sign in')
  return caller
}
