import { Op, QueryTypes } from 'sequelize'
import { v7 } from 'uuid'
import type { Change } from '../../../shared/api/changes.ts'
import type { Plan as Planned } from '../../../shared/routing/plan.ts'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import { database } from '../../database/connection.ts'
import { inTransaction, type Actor, type Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { PlanEntry } from '../../models/jobs/plan-entry.ts'
import { Plan } from '../../models/jobs/plan.ts'
import { Step } from '../../models/jobs/step.ts'
import { Site } from '../../models/sites/site.ts'
import { instantOf, minuteOf, withTimes, workingDaysOn } from './plan-clock.ts'
import { shopOfSite, type Names } from './shop-of-site.ts'
import { workOfSite, type Work } from './work-of-site.ts'

type NewEntry = { stepId: string; siteId: string; benchId: string | null; personId: string | null; startsAt: Date | null; endsAt: Date | null; why: string; rejected: { bench: string; because: string }[]; unplacedBecause: string | null; cures: string[] }

/**
 * Plans everything that is to do at a site and writes what moved. The site's plan is locked meanwhile, so two workers
 * never plan it at once. `knownEvent` is the event that asked for it: a plan that already knows of it is not made again.
 */
export async function planSite(siteId: string, { knownEvent, now = new Date() }: { knownEvent?: number; now?: Date }, actor: Actor): Promise<void> {
  await inTransaction(actor, async (tx) => {
    await database.query(`insert into plans (id, site_id, made_at, ledger_id, created_at) values ($1, $2, 'epoch', 0, now()) on conflict (site_id) do nothing`, { bind: [v7(), siteId], transaction: tx })
    const plan = await Plan.findOne({ where: { siteId }, lock: tx.LOCK.UPDATE, transaction: tx, raw: true })
    if (!plan || (knownEvent !== undefined && plan.ledgerId >= knownEvent)) return
    const [head] = await database.query<{ id: number }>(`select event_id as id from chain_heads where chain = 'all'`, { transaction: tx, type: QueryTypes.SELECT })
    const site = await Site.findByPk(siteId, { raw: true, transaction: tx })
    if (!site) return
    const minute = minuteOf(now)
    const { shop, names } = await shopOfSite(site, minute, tx)
    const work = await workOfSite(site, names, minute, tx)
    const planned = planShop({ ...shop, ...work.shop })
    const touches = [...(await writeEntries(work, planned, names, site, tx)), ...(await writeJobs(work, planned, site, tx))]
    await Plan.update({ madeAt: now, ledgerId: head?.id ?? 0 }, { where: { siteId }, transaction: tx })
    if (touches.length > 0) tx.record({ type: 'plan.made', id: plan.id, siteId, touches, data: { steps: planned.entries.length, unplaced: planned.unplaced.length, weightedTardiness: planned.totals.weightedTardiness } })
  })
}

async function writeEntries(work: Work, planned: Planned, names: Names, site: Site, tx: Tx): Promise<Change[]> {
  const at = new Map(work.steps.map((step) => [step.id, step]))
  const say = (sentence: string) => withTimes(withoutIds(sentence, at), site.timeZone)
  const fresh: NewEntry[] = [
    ...planned.entries.map((entry) => ({
      stepId: entry.step, siteId: site.id, benchId: names.benches.get(entry.bench)!, personId: entry.person ? (names.people.get(entry.person) ?? null) : null, startsAt: instantOf(entry.start), endsAt: instantOf(entry.end),
      why: say(entry.why?.chosen ?? ''), rejected: (entry.why?.rejected ?? []).map(({ bench, because }) => ({ bench, because: say(because) })), unplacedBecause: null, cures: [],
    })),
    ...planned.unplaced.map(({ step, because, cures }) => unplaced(step, site.id, say(because), cures.map(say))),
    ...work.held.map(({ id }) => unplaced(id, site.id, 'the sample is on hold or has not come', ['Answer the question of the hold'])),
  ]
  const moved = fresh.filter((entry) => !isSame(work.before.get(entry.stepId), entry))
  const gone = [...work.before.keys()].filter((stepId) => !fresh.some((entry) => entry.stepId === stepId))
  await PlanEntry.destroy({ where: { stepId: { [Op.in]: [...gone, ...moved.map(({ stepId }) => stepId)] } }, transaction: tx })
  await PlanEntry.bulkCreate(moved, { transaction: tx })
  const placed = planned.entries.map(({ step }) => step)
  await Step.update({ state: 'planned' }, { where: { id: { [Op.in]: placed }, state: 'to come' }, transaction: tx })
  await Step.update({ state: 'to come' }, { where: { id: { [Op.in]: fresh.filter(({ benchId }) => !benchId).map(({ stepId }) => stepId) }, state: 'planned' }, transaction: tx })
  const samples = new Set(moved.flatMap(({ stepId }) => { const step = at.get(stepId); return step ? [step.sampleId] : [] }))
  const jobs = new Set(moved.flatMap(({ stepId }) => { const step = at.get(stepId); return step ? [step.jobId] : [] }))
  return [...[...samples].map((id): Change => ({ subject: 'Sample', id })), ...[...jobs].map((id): Change => ({ subject: 'Job', id }))]
}

/** The expected finish is that of the last step and one working day for review and report. */
async function writeJobs(work: Work, planned: Planned, site: Site, tx: Tx): Promise<Change[]> {
  const touched: Change[] = []
  const waiting = [...new Set(work.held.map(({ jobId }) => jobId))].filter((id) => !planned.jobs.some((job) => job.id === id)).map((id) => ({ id, finish: null }))
  for (const { id, finish } of [...planned.jobs, ...waiting]) {
    const job = work.jobs.get(id)!
    const isWhole = finish !== null && !planned.unplaced.some(({ step }) => work.steps.find((one) => one.id === step)?.jobId === id) && !work.held.some(({ jobId }) => jobId === id)
    const expectedAt = isWhole ? workingDaysOn(instantOf(finish), 1, 17, site.hours, site.timeZone) : null
    const state = job.state === 'placed' ? 'awaiting samples' : job.state
    const promisedAt = job.promisedAt ?? expectedAt
    if (state === job.state && expectedAt?.getTime() === job.expectedAt?.getTime() && promisedAt?.getTime() === job.promisedAt?.getTime()) continue
    await Job.update({ expectedAt, promisedAt, state }, { where: { id, state: job.state }, transaction: tx })
    touched.push({ subject: 'Job', id })
  }
  return touched
}

const unplaced = (stepId: string, siteId: string, because: string, cures: string[]): NewEntry =>
  ({ stepId, siteId, benchId: null, personId: null, startsAt: null, endsAt: null, why: '', rejected: [], unplacedBecause: because, cures })

function isSame(before: PlanEntry | undefined, entry: NewEntry): boolean {
  return before !== undefined && before.benchId === entry.benchId && before.personId === entry.personId && before.startsAt?.getTime() === entry.startsAt?.getTime()
    && before.endsAt?.getTime() === entry.endsAt?.getTime() && before.unplacedBecause === entry.unplacedBecause
}

/** Steps and samples are named by id in the planner's sentences; people read the step's own label. */
function withoutIds(sentence: string, steps: Map<string, Step>): string {
  return sentence.replace(/\b[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[0-9a-f]{4}-[0-9a-f]{12}\b/g, (id) => steps.get(id)?.label ?? 'it')
}
