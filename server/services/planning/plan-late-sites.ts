import { QueryTypes } from 'sequelize'
import { database } from '../../database/connection.ts'
import { planSite } from './plan-site.ts'

/** Plans again wherever a planned start has passed by ten minutes and nobody has begun. Gives how many sites that were. */
export async function planLateSites(): Promise<number> {
  const sites = await database.query<{ siteId: string }>(
    `select distinct e.site_id as "siteId" from plan_entries e join steps s on s.id = e.step_id join plans p on p.site_id = e.site_id
     where s.state = 'planned' and e.starts_at < now() - interval '10 minutes' and p.made_at < now() - interval '10 minutes'`,
    { type: QueryTypes.SELECT },
  )
  for (const { siteId } of sites) await planSite(siteId, {}, { person: null, requestId: 'sweep:plan' })
  return sites.length
}
