import type { Order } from '../../../shared/api/orders.ts'
import { orderedTests } from '../../../shared/orders/ordered-test.ts'
import { travellerSteps } from '../../../shared/orders/traveller-steps.ts'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import type { Shop } from '../../../shared/routing/shop.ts'
import { Site } from '../../models/sites/site.ts'
import { endOfDay, instantOf, minuteOf, withTimes, workingDaysOn } from '../planning/plan-clock.ts'
import { shopOfSite } from '../planning/shop-of-site.ts'
import { availableFrom, workOfSite } from '../planning/work-of-site.ts'

/** When a site would be done with an order: null with the reason when it cannot be said. `receiveBy` is when the samples have to be there for that. */
export type SitePromise = { siteId: string; finish: Date | null; receiveBy: Date; because: string }

/** Working days that an order without a date may take, as when it is planned. */
const usualDays = 10
const job = 'the order'

/**
 * The earliest finish of an order at each of these sites, beside all that is planned there already: the order is put into the site's
 * plan as if it were placed now, and what the planner says of it is told. Nothing is written.
 */
export async function promiseForOrder(order: Order, siteIds: readonly string[], now: Date): Promise<SitePromise[]> {
  const promises: SitePromise[] = []
  for (const site of await Site.findAll({ where: { id: [...siteIds] }, order: [['name', 'ASC']], raw: true })) promises.push(await promiseAt(site, order, now))
  return promises
}

async function promiseAt(site: Site, order: Order, now: Date): Promise<SitePromise> {
  const minute = minuteOf(now)
  const { shop, names } = await shopOfSite(site, minute)
  const work = await workOfSite(site, names, minute)
  const here = availableFrom({ receivedAt: null }, { placedAt: now, createdAt: now }, site, minute)
  const due = order.neededBy ? endOfDay(order.neededBy, site.timeZone) - 7 * 60 : minuteOf(workingDaysOn(now, usualDays, 17, site.hours, site.timeZone))
  const { steps, labels } = stepsOf(order)
  // only constructed, not improved: this is asked while people type, and a later improvement keeps the promise all the more
  const planned = planShop({
    ...shop, effort: 0,
    jobs: [...work.shop.jobs, { id: job, due, weight: 1 }],
    samples: [...work.shop.samples, ...order.samples.map((_sample, row) => ({ id: sampleId(row), job, site: site.name, availableFrom: here }))],
    steps: [...work.shop.steps, ...steps],
  })
  const told = { siteId: site.id, receiveBy: instantOf(here) }
  const stuck = planned.unplaced.find(({ step }) => labels.has(step))
  if (stuck) return { ...told, finish: null, because: `${labels.get(stuck.step)}: ${readable(stuck.because, labels, site)}` }
  const finish = planned.jobs.find(({ id }) => id === job)?.finish ?? null
  // the last step and one working day for review and report
  return { ...told, finish: finish === null ? null : workingDaysOn(instantOf(finish), 1, 17, site.hours, site.timeZone), because: 'all steps at one site' }
}

function stepsOf(order: Order): { steps: Shop['steps']; labels: Map<string, string> } {
  const labels = new Map<string, string>()
  const steps = order.samples.flatMap((sample, row) => {
    const tests = orderedTests(order, sample).map(({ method, parameters }) => ({ needs: method && parameters ? method.needs(parameters) : [] }))
    return travellerSteps(tests).map(({ label, capability, need }, at): Shop['steps'][number] => {
      labels.set(stepId(row, at), label)
      const { setupMinutes, runMinutes, attended, needs } = need
      return { id: stepId(row, at), sample: sampleId(row), kind: capability, after: at === 0 ? [] : [stepId(row, at - 1)], setupMinutes, runMinutes, attended, needs, scope: null }
    })
  })
  return { steps, labels }
}

const sampleId = (row: number) => `ordered sample ${row}`
const stepId = (row: number, at: number) => `ordered step ${row}/${at}`

/** The planner names steps by id; people read what is done. */
function readable(sentence: string, labels: ReadonlyMap<string, string>, site: Site): string {
  return withTimes(sentence.replace(/ordered step \d+\/\d+/g, (id) => labels.get(id) ?? id).replace(/ordered sample \d+/g, 'the sample'), site.timeZone)
}
