import { DateTime } from 'luxon'
import { describe, expect, it } from 'vitest'
import { Job } from '../../../server/models/jobs/job.ts'
import { PlanEntry } from '../../../server/models/jobs/plan-entry.ts'
import { Plan } from '../../../server/models/jobs/plan.ts'
import { Sample } from '../../../server/models/jobs/sample.ts'
import { Step } from '../../../server/models/jobs/step.ts'
import { Authorisation } from '../../../server/models/people/authorisation.ts'
import { Person } from '../../../server/models/people/person.ts'
import { Bench } from '../../../server/models/sites/bench.ts'
import { Equipment } from '../../../server/models/sites/equipment.ts'
import { cancelJob } from '../../../server/services/jobs/cancel-job.ts'
import { releaseHold } from '../../../server/services/jobs/talk/release-hold.ts'
import { lastLedgerId } from '../../../server/services/ledger/read-ledger.ts'
import { instantOf, minuteOf, openIntervals } from '../../../server/services/planning/plan-clock.ts'
import { planLateSites } from '../../../server/services/planning/plan-late-sites.ts'
import { planSite } from '../../../server/services/planning/plan-site.ts'
import { shopOfSite } from '../../../server/services/planning/shop-of-site.ts'
import { workOfSite } from '../../../server/services/planning/work-of-site.ts'
import { finishStep } from '../../../server/services/samples/finish-step.ts'
import { receiveSample } from '../../../server/services/samples/receive-sample.ts'
import { startStep } from '../../../server/services/samples/start-step.ts'
import { startRun } from '../../../server/services/test-runs/start-run.ts'
import { planShop } from '../../../shared/routing/plan-shop.ts'
import { checkShop } from '../../../shared/routing/check-shop.ts'
import { Hold } from '../../../server/models/jobs/hold.ts'
import { checkPlan } from '../../shared/routing/check-plan.ts'
import { buildBench, buildMachine, buildVerification, hardnessAbility } from '../../support/build/benches.ts'
import { buildOrder } from '../../support/build/jobs.ts'
import { buildArrived, buildLab, buildWork, type Lab } from '../../support/build/runs.ts'
import { callerFor } from '../../support/caller.ts'
import { eventsOf } from '../../support/events.ts'

const worker = { person: null, requestId: 'task:test' }
const plan = ({ site }: Pick<Lab, 'site'>, options: { knownEvent?: number; now?: Date } = {}) => planSite(site.id, options, worker)
const entriesAt = async ({ site }: Pick<Lab, 'site'>) => PlanEntry.findAll({ where: { siteId: site.id }, order: [['stepId', 'ASC']], raw: true })
const jobOf = async (id: string) => (await Job.findByPk(id, { raw: true }))!
const stepOf = async (id: string) => (await Step.findByPk(id, { raw: true }))!

/** The plan that the planner makes of the site as it stands, held against every rule of planning. */
async function checked({ site }: Pick<Lab, 'site'>, now: Date) {
  const minute = minuteOf(now)
  const { shop: frame, names } = await shopOfSite(site, minute)
  const work = await workOfSite(site, names, minute)
  const shop = { ...frame, ...work.shop }
  return { issues: checkShop(shop), faults: checkPlan(shop, planShop(shop)), shop }
}

describe('planning a site', () => {
  it('places every step of a placed job, in order and within hours, and says when it will be done', async () => {
    const lab = await buildLab()
    const { job, steps, samples } = await buildWork(lab, buildOrder({}, { count: 3 }))
    const now = new Date()
    expect(await checked(lab, now)).toMatchObject({ issues: [], faults: [] })
    await plan(lab, { now })
    const entries = await entriesAt(lab)
    expect(entries).toHaveLength(6)
    for (const { stepId, benchId, personId, startsAt, endsAt, why, unplacedBecause } of entries) {
      const step = await stepOf(stepId)
      expect(step.state).toBe('planned')
      expect([benchId, personId, unplacedBecause]).toEqual([step.capability === 'section' ? lab.cutting.id : lab.hardness.id, expect.any(String), null])
      expect(endsAt!.getTime() - startsAt!.getTime()).toBe((step.need.setupMinutes + step.need.runMinutes) * 60_000)
      const open = openIntervals(lab.cutting.hours, 'Europe/London', minuteOf(now), minuteOf(now) + 40_000)
      expect(open.some(([from, to]) => instantOf(from) <= startsAt! && endsAt! <= instantOf(to))).toBe(true)
      expect(why).not.toBe('')
      expect(why).not.toMatch(/[0-9a-f]{8}-[0-9a-f]{4}|minute \d/)
    }
    for (const { id } of samples) {
      const [cut, measure] = steps.filter(({ sampleId }) => sampleId === id).map((step) => entries.find(({ stepId }) => stepId === step.id)!)
      expect(measure!.startsAt!.getTime()).toBeGreaterThanOrEqual(cut!.endsAt!.getTime())
    }
    const planned = await jobOf(job.id)
    const last = DateTime.fromMillis(Math.max(...entries.map(({ endsAt }) => endsAt!.getTime())), { zone: 'Europe/London' })
    let due = last.startOf('day').plus({ days: 1 })
    while (due.weekday > 5) due = due.plus({ days: 1 })
    expect(planned).toMatchObject({ state: 'awaiting samples', expectedAt: due.set({ hour: 17 }).toJSDate() })
    expect(planned.promisedAt).not.toBeNull()
    const made = (await Plan.findOne({ where: { siteId: lab.site.id }, raw: true }))!
    expect(made.madeAt).toEqual(now)
    expect((await eventsOf(made.id)).at(-1)).toMatchObject({ type: 'plan.made', data: { steps: 6, unplaced: 0 }, requestId: 'task:test' })
  })

  it('changes nothing when nothing has changed', async () => {
    const lab = await buildLab()
    const { job } = await buildWork(lab)
    const now = new Date()
    await plan(lab, { now })
    const [before, head, done] = [await entriesAt(lab), await lastLedgerId(), await jobOf(job.id)]
    await plan(lab, { now })
    expect(await entriesAt(lab)).toEqual(before)
    expect(await lastLedgerId()).toBe(head)
    expect(await jobOf(job.id)).toEqual(done)
  })

  it('leaves a plan alone that knows of the event already, and makes it for a newer one', async () => {
    const lab = await buildLab()
    await buildWork(lab)
    await plan(lab, { now: new Date('2027-03-01T09:00Z') })
    const known = (await Plan.findOne({ where: { siteId: lab.site.id }, raw: true }))!
    await plan(lab, { knownEvent: known.ledgerId, now: new Date('2027-03-02T09:00Z') })
    expect((await Plan.findOne({ where: { siteId: lab.site.id }, raw: true }))!.madeAt).toEqual(known.madeAt)
    await plan(lab, { knownEvent: known.ledgerId + 1, now: new Date('2027-03-02T09:00Z') })
    expect((await Plan.findOne({ where: { siteId: lab.site.id }, raw: true }))!.madeAt).toEqual(new Date('2027-03-02T09:00Z'))
  })

  it('by several workers at once gives one plan', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab, buildOrder({}, { count: 4 }))
    const now = new Date()
    const event = await lastLedgerId()
    const done = await Promise.allSettled(Array.from({ length: 4 }, () => plan(lab, { knownEvent: event, now })))
    expect(done.map(({ status }) => status)).toEqual(Array(4).fill('fulfilled'))
    const entries = await entriesAt(lab)
    expect(entries.map(({ stepId }) => stepId)).toEqual(steps.map(({ id }) => id).sort())
    const { id } = (await Plan.findOne({ where: { siteId: lab.site.id }, raw: true }))!
    expect((await eventsOf(id)).filter(({ type }) => type === 'plan.made')).toHaveLength(1)
  })

  it('at the same time as samples come in breaks neither', async () => {
    const lab = await buildLab()
    const { job, samples } = await buildWork(lab, buildOrder({}, { count: 4 }))
    const technician = await callerFor(lab.technician)
    const done = await Promise.allSettled([
      ...samples.map((sample) => receiveSample(sample.id, { version: sample.version, condition: 'dry', mismatch: null }, technician)), plan(lab), plan(lab),
    ])
    expect(done.filter(({ status }) => status === 'rejected')).toEqual([])
    expect((await jobOf(job.id)).state).toBe('in work')
    expect(await Sample.count({ where: { jobId: job.id, state: 'received' } })).toBe(4)
  })

  it('is refused for a site that is not there', async () => {
    await expect(plan({ site: { ...(await buildLab()).site, id: '01970000-0000-7000-8000-000000000000' } })).rejects.toThrow(/foreign key/)
  })
})

describe('what stands in the way of a step', () => {
  const measureOf = (steps: Step[]) => steps.find(({ capability }) => capability === 'rockwell')!
  const entryOf = async (lab: Lab, id: string) => (await entriesAt(lab)).find(({ stepId }) => stepId === id)!

  it('is the end of a calibration, unless another bench can', async () => {
    const lab = await buildLab()
    const { steps, job } = await buildWork(lab)
    // the sample comes tomorrow at the earliest
    await Equipment.update({ calibratedUntil: DateTime.now().setZone('Europe/London').toISODate() }, { where: { id: lab.machine.id } })
    await plan(lab)
    const entry = await entryOf(lab, measureOf(steps).id)
    expect(entry).toMatchObject({ benchId: null, startsAt: null, unplacedBecause: expect.any(String) })
    expect(entry.unplacedBecause).not.toMatch(/[0-9a-f]{8}-[0-9a-f]{4}/)
    expect(entry.cures.length).toBeGreaterThan(0)
    expect((await stepOf(measureOf(steps).id)).state).toBe('to come')
    expect(await jobOf(job.id)).toMatchObject({ expectedAt: null, state: 'awaiting samples' })
    const second = await buildBench(lab.site.id, [hardnessAbility], { equipmentId: (await buildMachine(lab.site.id)).id })
    await plan(lab)
    expect(await entryOf(lab, measureOf(steps).id)).toMatchObject({ benchId: second.id, unplacedBecause: null, cures: [] })
    expect((await stepOf(measureOf(steps).id)).state).toBe('planned')
    expect((await jobOf(job.id)).expectedAt).not.toBeNull()
  })

  it('is a failed verification, a machine or bench out of use', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab)
    const isPlaced = async () => { await plan(lab); return (await entryOf(lab, measureOf(steps).id)).benchId !== null }
    expect(await isPlaced()).toBe(true)
    await buildVerification(lab.machine, { passed: false })
    expect(await isPlaced()).toBe(false)
    await buildVerification(lab.machine, { passed: true, at: new Date(Date.now() + 1000) })
    expect(await isPlaced()).toBe(true)
    await Equipment.update({ outOfUse: true }, { where: { id: lab.machine.id } })
    expect(await isPlaced()).toBe(false)
    await Equipment.update({ outOfUse: false }, { where: { id: lab.machine.id } })
    await Bench.update({ out: true }, { where: { id: lab.hardness.id } })
    expect(await isPlaced()).toBe(false)
  })

  it('is a force that no bench has', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab)
    await Bench.update({ does: [{ kind: 'rockwell', limits: { forceKgf: [15, 100] } }] }, { where: { id: lab.hardness.id } })
    await plan(lab)
    expect((await entryOf(lab, measureOf(steps).id)).benchId).toBeNull()
  })

  it('is the end of every authorisation; whoever still has one gets the step', async () => {
    const lab = await buildLab()
    const { steps } = await buildWork(lab)
    const today = DateTime.now().setZone('Europe/London').toISODate()!
    await Authorisation.update({ until: today }, { where: { personId: lab.technician.id, right: 'carry out' } })
    await plan(lab)
    expect((await entryOf(lab, measureOf(steps).id)).personId).toBe(lab.reviewer.id)
    await Authorisation.update({ until: today }, { where: { personId: lab.reviewer.id, right: 'carry out' } })
    await plan(lab)
    expect(await entryOf(lab, measureOf(steps).id)).toMatchObject({ benchId: null, personId: null })
    expect((await entryOf(lab, steps[0]!.id)).benchId).toBe(lab.cutting.id)
  })

  it('is a hold, until it is released', async () => {
    const lab = await buildLab()
    const { samples: [sample], steps, job } = await buildWork(lab)
    const technician = await callerFor(lab.technician)
    await plan(lab)
    await receiveSample(sample!.id, { version: sample!.version, condition: 'dry', mismatch: { reason: 'It is stamped 7K4191.', question: 'Which heat is it?', answers: [] } }, technician)
    await plan(lab)
    expect((await entriesAt(lab)).map(({ benchId, unplacedBecause }) => [benchId, unplacedBecause])).toEqual(steps.map(() => [null, 'the sample is on hold or has not come']))
    expect(await Step.count({ where: { jobId: job.id, state: 'to come' } })).toBe(2)
    expect((await jobOf(job.id)).expectedAt).toBeNull()
    const hold = (await Hold.findOne({ where: { jobId: job.id }, raw: true }))!
    await releaseHold(hold.id, { version: hold.version, remark: '' }, technician)
    await plan(lab)
    expect((await entriesAt(lab)).every(({ benchId }) => benchId !== null)).toBe(true)
    expect((await jobOf(job.id)).expectedAt).not.toBeNull()
  })
})

describe('work that has begun', () => {
  it('stays where it is, at its bench and time, whatever else is planned', async () => {
    const lab = await buildLab()
    const { samples, steps } = await buildArrived(lab, buildOrder({}, { count: 2 }))
    const technician = await callerFor(lab.technician)
    const cut = steps.find(({ sampleId, capability }) => sampleId === samples[1]!.id && capability === 'section')!
    await plan(lab)
    await startStep(cut.id, lab.cutting.id, technician)
    const { startedAt } = await stepOf(cut.id)
    await plan(lab)
    const entry = (await entriesAt(lab)).find(({ stepId }) => stepId === cut.id)!
    expect([entry.benchId, entry.personId]).toEqual([lab.cutting.id, lab.technician.id])
    expect(Math.abs(entry.startsAt!.getTime() - startedAt!.getTime())).toBeLessThanOrEqual(60_000)
    expect(await stepOf(cut.id)).toMatchObject({ state: 'started', startedAt })
    const { faults } = await checked(lab, new Date())
    expect(faults).toEqual([])
    await finishStep(cut.id, { remark: '' }, technician)
    await plan(lab)
    expect((await entriesAt(lab)).map(({ stepId }) => stepId)).not.toContain(cut.id)
  })

  it('by someone who has left the house since does not stop the plan', async () => {
    const lab = await buildLab()
    const { samples, steps, tests } = await buildArrived(lab, buildOrder({}, { count: 2 }))
    const technician = await callerFor(lab.technician)
    const cuts = samples.map(({ id }) => steps.find(({ sampleId, capability }) => sampleId === id && capability === 'section')!)
    await startStep(cuts[0]!.id, lab.cutting.id, technician)
    await finishStep(cuts[0]!.id, { remark: '' }, technician)
    await startRun(tests.find(({ sampleId }) => sampleId === samples[0]!.id)!.id, lab.hardness.id, technician)
    await Person.update({ state: 'disabled' }, { where: { id: lab.technician.id } })
    await plan(lab)
    expect((await entriesAt(lab)).find(({ stepId }) => stepId === cuts[1]!.id)).toMatchObject({ benchId: lab.cutting.id, personId: lab.reviewer.id })
  })

  it('keeps near steps where they were when more work comes', async () => {
    const lab = await buildLab()
    // in opening hours, so that steps fall into the hours that are kept
    const now = new Date('2027-03-09T09:00:00Z')
    const { job } = await buildArrived(lab)
    await Sample.update({ receivedAt: new Date('2027-03-09T08:00:00Z') }, { where: { jobId: job.id } })
    await Job.update({ placedAt: new Date('2027-03-08T08:00:00Z') }, { where: { id: job.id } })
    await plan(lab, { now })
    const before = await entriesAt(lab)
    const urgent = await buildArrived(lab, buildOrder({ neededBy: '2027-03-10' }, { count: 3 }))
    await Sample.update({ receivedAt: new Date('2027-03-09T08:00:00Z') }, { where: { jobId: urgent.job.id } })
    await plan(lab, { now })
    const after = await entriesAt(lab)
    expect(after).toHaveLength(before.length + 6)
    for (const { stepId, benchId, startsAt } of before) expect(after.find((entry) => entry.stepId === stepId)).toMatchObject({ benchId, startsAt })
    expect((await checked(lab, now)).faults).toEqual([])
  })
})

it('a cancelled job leaves the plan', async () => {
  const lab = await buildLab()
  const { job } = await buildWork(lab)
  await plan(lab)
  await cancelJob(job.id, { version: (await jobOf(job.id)).version, reason: 'ordered twice' }, await callerFor(lab.client))
  await plan(lab)
  expect(await entriesAt(lab)).toEqual([])
  expect(await jobOf(job.id)).toMatchObject({ state: 'cancelled', expectedAt: null })
})

it('a job without a date is promised once and keeps its promise when the plan moves', async () => {
  const lab = await buildLab()
  const { job } = await buildWork(lab)
  await plan(lab)
  const { promisedAt } = await jobOf(job.id)
  await plan(lab, { now: new Date(Date.now() + 10 * 24 * 3600_000) })
  const later = await jobOf(job.id)
  expect(later.promisedAt).toEqual(promisedAt)
  expect(later.expectedAt!.getTime()).toBeGreaterThan(promisedAt!.getTime())
})

it('a site whose planned start has passed is planned again, once', async () => {
  const lab = await buildLab()
  await buildWork(lab)
  await plan(lab)
  await PlanEntry.update({ startsAt: new Date(Date.now() - 3600_000) }, { where: { siteId: lab.site.id } })
  await Plan.update({ madeAt: new Date(Date.now() - 3600_000) }, { where: { siteId: lab.site.id } })
  expect(await planLateSites()).toBe(1)
  for (const { startsAt } of await entriesAt(lab)) expect(startsAt!.getTime()).toBeGreaterThan(Date.now())
  expect(await planLateSites()).toBe(0)
})
