import { Op, type Transaction } from 'sequelize'
import type { Shop } from '../../../shared/routing/shop.ts'
import { Job } from '../../models/jobs/job.ts'
import { PlanEntry } from '../../models/jobs/plan-entry.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import type { Site } from '../../models/sites/site.ts'
import { endOfDay, instantOf, minuteOf, workingDaysOn } from './plan-clock.ts'
import type { Names } from './shop-of-site.ts'

export type Work = { shop: Pick<Shop, 'jobs' | 'samples' | 'steps'>; steps: Step[]; held: Step[]; jobs: Map<string, Job>; before: Map<string, PlanEntry> }

/** Working days that a job without a date may take. */
const usualDays = 10

/** Everything that is still to do at a site, as the planner wants it. Steps of samples on hold or missing wait outside the plan. */
export async function workOfSite(site: Site, names: Names, now: number, tx?: Transaction): Promise<Work> {
  const steps = await Step.findAll({ where: { siteId: site.id, state: { [Op.in]: ['to come', 'planned', 'started'] } }, raw: true, order: [['sampleId', 'ASC'], ['position', 'ASC']], transaction: tx })
  const samples = new Map((await Sample.findAll({ where: { id: { [Op.in]: [...new Set(steps.map(({ sampleId }) => sampleId))] } }, raw: true, transaction: tx })).map((one) => [one.id, one]))
  const jobs = new Map((await Job.findAll({ where: { id: { [Op.in]: [...new Set(steps.map(({ jobId }) => jobId))] }, state: { [Op.in]: ['placed', 'awaiting samples', 'in work', 'in review'] } }, raw: true, transaction: tx })).map((one) => [one.id, one]))
  const before = new Map((await PlanEntry.findAll({ where: { siteId: site.id }, raw: true, transaction: tx })).map((one) => [one.stepId, one]))

  const live = steps.filter((step) => jobs.has(step.jobId))
  const waits = (step: Step) => { const sample = samples.get(step.sampleId)!; return step.state !== 'started' && (sample.onHold || sample.state === 'missing' || sample.state === 'void') }
  const planned = live.filter((step) => !waits(step))
  const bench = reversed(names.benches)
  const person = reversed(names.people)
  const inPlan = new Set(planned.map(({ id }) => id))
  const previousOf = new Map<string, string>()

  return {
    steps: planned, held: live.filter(waits), jobs, before,
    shop: {
      jobs: [...jobs.values()].filter(({ id }) => planned.some(({ jobId }) => jobId === id)).map((job) => ({ id: job.id, due: dueOf(job, site), weight: 1 })),
      samples: [...new Set(planned.map(({ sampleId }) => sampleId))].map((id) => {
        const sample = samples.get(id)!
        return { id: sample.id, job: sample.jobId, site: site.name, availableFrom: availableFrom(sample, jobs.get(sample.jobId)!, site, now) }
      }),
      steps: planned.map((step): Shop['steps'][number] => {
        const last = previousOf.get(step.sampleId)
        previousOf.set(step.sampleId, step.id)
        const entry = before.get(step.id)
        const started = step.state === 'started' && step.benchId && step.startedAt && bench.has(step.benchId)
        return {
          id: step.id, sample: step.sampleId, kind: step.capability, after: last && inPlan.has(last) ? [last] : [], setupMinutes: step.need.setupMinutes, runMinutes: step.need.runMinutes,
          attended: step.need.attended, needs: step.need.needs, scope: null,
          ...(entry?.benchId && entry.startsAt && bench.has(entry.benchId) && { previous: { bench: bench.get(entry.benchId)!, person: entry.personId ? (person.get(entry.personId) ?? null) : null, start: minuteOf(entry.startsAt) } }),
          ...(started && {
            state: 'started' as const,
            actual: { bench: bench.get(step.benchId!)!, person: step.need.attended === 'none' || !step.startedById ? null : (person.get(step.startedById) ?? null), start: Math.min(minuteOf(step.startedAt!), now) },
          }),
        }
      }),
    },
  }
}

function dueOf(job: Job, site: Site): number {
  if (job.neededBy) return endOfDay(job.neededBy, site.timeZone) - 7 * 60
  return minuteOf(job.promisedAt ?? workingDaysOn(job.placedAt ?? job.createdAt, usualDays, 17, site.hours, site.timeZone))
}

/** A received sample is here; one that is expected comes on the next working day at ten, and again the next if it did not. */
export function availableFrom(sample: { receivedAt: Date | null }, job: { placedAt: Date | null; createdAt: Date }, site: Site, now: number): number {
  if (sample.receivedAt) return Math.min(minuteOf(sample.receivedAt), now)
  const first = minuteOf(workingDaysOn(job.placedAt ?? job.createdAt, 1, 10, site.hours, site.timeZone))
  return first > now ? first : minuteOf(workingDaysOn(instantOf(now), 1, 10, site.hours, site.timeZone))
}

const reversed = (names: Map<string, string>) => new Map([...names].map(([name, id]) => [id, name]))
