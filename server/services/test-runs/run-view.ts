import { subject } from '@casl/ability'
import { Op } from 'sequelize'
import type { TestRun as TestRunView } from '../../../shared/api/test-runs.ts'
import { methodOf } from '../../../shared/methods.ts'
import type { Caller } from '../../caller.ts'
import { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Test } from '../../models/jobs/test.ts'
import { Customer } from '../../models/people/customer.ts'
import { Person } from '../../models/people/person.ts'
import { Result } from '../../models/runs/result.ts'
import { Review } from '../../models/runs/review.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { Bench } from '../../models/sites/bench.ts'
import { Site } from '../../models/sites/site.ts'
import { equipmentViews } from '../equipment/equipment-view.ts'
import { travellersOf } from '../samples/views-of-samples.ts'
import { authorisedUntil } from './authorised-until.ts'
import { readingsOf } from './live-readings.ts'

/** A run with everything that the bench and the reviewer look at. */
export async function runView(run: TestRun, caller: Caller): Promise<TestRunView> {
  const [test, sample, job, bench, site, kept, reviews] = await Promise.all([
    Test.findByPk(run.testId, { raw: true }), Sample.findByPk(run.sampleId, { raw: true }), Job.findByPk(run.jobId, { raw: true }), Bench.findByPk(run.benchId, { raw: true }),
    Site.findByPk(run.siteId, { raw: true }), readingsOf(run.id), Review.findAll({ where: { testRunId: run.id }, raw: true }),
  ])
  if (!test || !sample || !job || !bench || !site) throw new Error(`run ${run.id} has lost what it belongs to`)
  const people = new Set([run.performedById, ...kept.flatMap(({ reading, strike }) => [reading.byId, ...(strike ? [strike.byId] : [])]), ...reviews.map(({ byId }) => byId)])
  const [names, customer, machines, travellers, others, right] = await Promise.all([
    namesOf([...people]), Customer.findByPk(job.customerId, { raw: true }), equipmentViews(run.equipmentId ? [run.equipmentId] : []), travellersOf([sample.id]),
    acceptedResults(sample.id, test.id), authorisedUntil(run.performedById, run.methodId, 'carry out', site.timeZone),
  ])
  return {
    id: run.id, testId: run.testId, sampleId: run.sampleId, jobId: run.jobId, number: run.number, state: run.state, version: run.version, methodId: run.methodId, methodVersion: run.methodVersion,
    siteId: run.siteId, siteName: site.name, timeZone: site.timeZone, benchId: run.benchId, benchName: bench.name, equipment: run.equipmentId ? (machines.get(run.equipmentId) ?? null) : null,
    performedById: run.performedById, performedBy: names.get(run.performedById) ?? '', startedAt: run.startedAt.toISOString(), recordedAt: run.recordedAt?.toISOString() ?? null,
    sampleNumber: sample.number, heat: sample.heat, lot: sample.lot, material: sample.material, piece: sample.piece, purchaseOrder: job.purchaseOrder, customerName: customer?.name ?? '', neededBy: job.neededBy,
    traveller: travellers.get(sample.id) ?? [], parameters: test.parameters, requirement: test.requirement,
    readings: kept.map(({ reading, strike }) => ({
      id: reading.id, key: reading.key, path: reading.path, value: reading.value, at: reading.createdAt.toISOString(), by: names.get(reading.byId) ?? '',
      struck: strike ? { reason: strike.reason, at: strike.createdAt.toISOString(), by: names.get(strike.byId) ?? '' } : null,
    })),
    evaluation: run.evaluation, remark: run.remark,
    reviews: reviews.map((review) => ({ id: review.id, outcome: review.outcome, remark: review.remark, readings: review.readings, at: review.createdAt.toISOString(), by: names.get(review.byId) ?? '' })),
    ...(await reviewRight(run, caller, site.timeZone)), authorisedUntil: right, sameSample: others,
  }
}

/** Why the caller may not review this run, empty when they may, and until when. */
async function reviewRight(run: TestRun, caller: Caller, timeZone: string): Promise<Pick<TestRunView, 'notMineToReview' | 'mayReviewUntil'>> {
  const record = subject('TestRun', { siteId: run.siteId, performedById: run.performedById })
  if (!caller.ability.can('review', record)) return { notMineToReview: caller.ability.relevantRuleFor('review', record)?.reason ?? 'You may not review runs.', mayReviewUntil: null }
  const mayReviewUntil = await authorisedUntil(caller.person.id, run.methodId, 'review', timeZone)
  const notMineToReview = mayReviewUntil ? '' : `You are not authorised to review ${methodOf(run.methodId)?.title ?? run.methodId}, or the authorisation has ended.`
  return { notMineToReview, mayReviewUntil }
}

async function namesOf(ids: string[]): Promise<Map<string, string>> {
  return new Map((await Person.findAll({ where: { id: { [Op.in]: ids } }, attributes: ['id', 'name'], raw: true })).map(({ id, name }) => [id, name]))
}

async function acceptedResults(sampleId: string, testId: string): Promise<TestRunView['sameSample']> {
  const tests = await Test.findAll({ where: { sampleId, id: { [Op.ne]: testId }, state: { [Op.in]: ['recorded', 'accepted', 'reported'] } }, raw: true })
  const runs = await TestRun.findAll({ where: { testId: { [Op.in]: tests.map(({ id }) => id) }, state: { [Op.in]: ['recorded', 'accepted'] } }, attributes: ['id', 'testId'], raw: true })
  const results = await Result.findAll({ where: { testRunId: { [Op.in]: runs.map(({ id }) => id) } }, order: [['position', 'ASC']], raw: true })
  return results.flatMap(({ testId: of, symbol, reported, value, key }) => {
    const test = tests.find(({ id }) => id === of)
    return test && key === methodOf(test.methodId)?.mainResult ? [{ label: test.label, symbol, reported, value, key }] : []
  })
}
