import { Op } from 'sequelize'
import type { Order } from '../../../shared/api/orders.ts'
import { orderedTests } from '../../../shared/orders/ordered-test.ts'
import { travellerSteps } from '../../../shared/orders/traveller-steps.ts'
import { promiseFor } from '../../../shared/routing/promise-for.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { Site } from '../../models/sites/site.ts'
import { instantOf, minuteOf, workingDaysOn } from '../planning/plan-clock.ts'
import { shopOfSite } from '../planning/shop-of-site.ts'
import { workOfSite } from '../planning/work-of-site.ts'

/** When a site would be done with an order, if it can be said: `receiveBy` is when its samples have to be there for that. */
export type SitePromise = { siteId: string; finish: Date; receiveBy: Date; because: string }

const asked = 'the order that is asked about'
/** Samples are counted on the next working day at ten. */
const daysToCome = 1

/** The earliest finish of an order at each of these sites, beside all that is planned there already. A site is left out when nothing can be promised for it. */
export async function promiseForOrder(order: Order, siteIds: readonly string[], now: Date): Promise<SitePromise[]> {
  const sites = await Site.findAll({ where: { id: { [Op.in]: [...siteIds] } }, raw: true })
  const promises = await Promise.all(sites.map((site) => promiseAt(site, order, now)))
  return promises.filter((promise) => promise !== null)
}

async function promiseAt(site: Site, order: Order, now: Date): Promise<SitePromise | null> {
  const minute = minuteOf(now)
  const { shop, names } = await shopOfSite(site, minute)
  const { shop: work } = await workOfSite(site, names, minute)
  const receiveBy = workingDaysOn(now, daysToCome, 10, site.hours, site.timeZone)
  const steps = stepsOf(order)
  if (steps.length === 0) return null
  const samples = [...new Set(steps.map(({ sample }) => sample))].map((id) => ({ id, job: asked, site: site.name, availableFrom: minuteOf(receiveBy) }))
  const job = { id: asked, due: minuteOf(workingDaysOn(now, 10, 17, site.hours, site.timeZone)), weight: 1 }
  const { finish } = promiseFor({ ...shop, jobs: [...work.jobs, job], samples: [...work.samples, ...samples], steps: [...work.steps, ...steps] }, asked)
  // an order with a step that has no place counts as finished at the horizon: that is no promise
  if (finish === null || finish >= shop.horizon) return null
  return { siteId: site.id, finish: workingDaysOn(instantOf(finish), 1, 17, site.hours, site.timeZone), receiveBy, because: '' }
}

/** The order's steps as the planner wants them, each sample's one after the other. */
function stepsOf(order: Order): Shop['steps'] {
  return order.samples.flatMap((sample, row) => {
    const tests = orderedTests(order, sample).map(({ method, parameters }) => ({ needs: method && parameters ? method.needs(parameters) : [] }))
    return travellerSteps(tests).map(({ capability, need }, at): Shop['steps'][number] => ({
      id: `${row}.${at}`, sample: `row ${row}`, kind: capability, after: at > 0 ? [`${row}.${at - 1}`] : [], setupMinutes: need.setupMinutes, runMinutes: need.runMinutes, attended: need.attended, needs: need.needs, scope: null,
    }))
  })
}
