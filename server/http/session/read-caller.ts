import { QueryTypes } from 'sequelize'
import { abilityFor } from '../../../shared/access/abilities.ts'
import type { Role } from '../../../shared/api/words.ts'
import type { Caller } from '../../caller.ts'
import { database } from '../../database/connection.ts'

type Found = Omit<Caller['person'], 'siteIds'> & { siteIds: string[]; epoch: number }

/** A person of a customer has no site, one of a site has that, and one of neither has them all. */
const sql = `
  select id, name, email, role, customer_id as "customerId", session_epoch as epoch,
    case when customer_id is not null then '{}'::uuid[] when site_id is not null then array[site_id] else array(select s.id from sites s order by s.id) end as "siteIds"
  from people where id = $1 and state = 'active'`

/**
 * The signed-in person as they are now, or null when they may not sign in any more or the session is older than their last
 * change of password. One query by primary key per request, so that an ended session is dead at once.
 */
export async function readCaller(personId: string, epoch: number | undefined, requestId: string): Promise<Caller | null> {
  const [found] = await database.query<Found & { role: Role }>(sql, { bind: [personId], type: QueryTypes.SELECT })
  if (!found || found.epoch !== epoch) return null
  const { id, name, email, role, customerId, siteIds } = found
  return { person: { id, name, email, role, customerId, siteIds }, ability: abilityFor(found), requestId }
}
