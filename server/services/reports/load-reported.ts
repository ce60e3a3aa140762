import { Op, type Transaction } from 'sequelize'
import { methodOf } from '../../../shared/methods.ts'
import { sizeText } from '../../../shared/orders/size-text.ts'
import type { Reported, ReportedRun, ReportedTest } from '../../../shared/reports/reported.ts'
import { Hold } from '../../models/jobs/hold.ts'
import type { Job } from '../../models/jobs/job.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { Test } from '../../models/jobs/test.ts'
import { Company } from '../../models/people/company.ts'
import { Customer } from '../../models/people/customer.ts'
import { Person } from '../../models/people/person.ts'
import { Reading } from '../../models/runs/reading.ts'
import { Review } from '../../models/runs/review.ts'
import { Strike } from '../../models/runs/strike.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { Equipment } from '../../models/sites/equipment.ts'
import { Site } from '../../models/sites/site.ts'
import { engineInput, type KeptReading } from '../test-runs/live-readings.ts'

/** All that a job's report is made of, as it stands: its accepted runs with their readings, and who did what on which machine. */
export async function loadReported(job: Job, tx: Transaction): Promise<Omit<Reported, 'report' | 'earlier'>> {
  const of = { raw: true as const, transaction: tx }
  const here = { where: { jobId: job.id }, ...of }
  const company = await Company.findOne(of)
  const site = await Site.findByPk(job.siteId, of)
  const customer = await Customer.findByPk(job.customerId, of)
  if (!company || !site || !customer || !job.placedAt) throw new Error(`job ${job.number} lacks company, site, customer or day of placing`)
  const samples = await Sample.findAll({ ...here, order: [['position', 'ASC']] })
  const tests = await Test.findAll({ ...here, order: [['position', 'ASC']] })
  const holds = await Hold.findAll({ ...here, order: [['id', 'ASC']] })
  const runs = await loadRuns(job.id, tests, tx)
  const shown = samples.filter(({ state }) => state !== 'void')
  return {
    company: { name: company.name, address: company.address, email: company.email },
    site: { name: site.name, address: site.address, timeZone: site.timeZone },
    customer: { name: customer.name, address: customer.address },
    job: { number: job.number, purchaseOrder: job.purchaseOrder, placedAt: job.placedAt },
    samples: shown.map(({ id, number, heat, lot, material, piece, condition, receivedAt }) => ({
      number, heat, lot, material, size: [piece.form, sizeText(piece)].filter(Boolean).join(' '), condition, receivedAt, remarks: holds.filter(({ sampleId }) => sampleId === id).flatMap(holdWords),
    })),
    tests: shown.flatMap((sample) => tests.filter(({ sampleId }) => sampleId === sample.id).map((test): ReportedTest => {
      const method = methodOf(test.methodId)
      if (!method) throw new Error(`test ${test.id} names a method that is gone: ${test.methodId}`)
      return { sample: sample.number, label: test.label, method, requirement: test.requirement, run: runs.get(test.id) ?? null }
    })),
  }
}

/** What was asked and answered about a sample on hold. */
function holdWords({ reason, answer }: Hold): string[] {
  return [answer ? `${reason} The customer answered: ${answer}` : reason].filter(Boolean)
}

async function loadRuns(jobId: string, tests: readonly Test[], tx: Transaction): Promise<Map<string, ReportedRun>> {
  const of = { raw: true as const, transaction: tx }
  const runs = await TestRun.findAll({ where: { jobId, state: 'accepted' }, ...of })
  const ofRuns = { where: { testRunId: { [Op.in]: runs.map(({ id }) => id) } }, ...of }
  const [readings, strikes, reviews, equipment] = [
    await Reading.findAll({ ...ofRuns, order: [['createdAt', 'ASC'], ['id', 'ASC']] }), await Strike.findAll(ofRuns), await Review.findAll(ofRuns),
    await Equipment.findAll({ where: { id: { [Op.in]: runs.flatMap(({ equipmentId }) => equipmentId ?? []) } }, ...of }),
  ]
  const people = await Person.findAll({ where: { id: { [Op.in]: [...runs.map(({ performedById }) => performedById), ...reviews.map(({ byId }) => byId)] } }, attributes: ['id', 'name'], ...of })
  const nameOf = (personId: string) => people.find(({ id }) => id === personId)?.name ?? ''
  const struck = new Map(strikes.map((strike) => [strike.readingId, strike]))
  const kept = new Map<string, KeptReading[]>()
  for (const reading of readings) kept.set(reading.testRunId, [...(kept.get(reading.testRunId) ?? []), { reading, strike: struck.get(reading.id) ?? null }])
  return new Map(runs.flatMap((run) => {
    const test = tests.find(({ id }) => id === run.testId)
    const review = reviews.find(({ testRunId, outcome }) => testRunId === run.id && outcome === 'accepted')
    const method = methodOf(run.methodId)
    if (!test || test.state === 'void' || !run.evaluation || !run.recordedAt || !review || !method) return []
    const own = kept.get(run.id) ?? []
    const machine = equipment.find(({ id }) => id === run.equipmentId)
    return [[run.testId, {
      input: engineInput(method, test, own), evaluation: run.evaluation, remark: run.remark, struck: own.flatMap(({ reading, strike }) => (strike ? [{ path: reading.path, reason: strike.reason }] : [])),
      equipment: machine ? `${machine.code} (${machine.certificate})`.replace(' ()', '') : null, performedBy: nameOf(run.performedById), reviewedBy: nameOf(review.byId),
      startedAt: run.startedAt, recordedAt: run.recordedAt, reviewedAt: review.createdAt,
    } satisfies ReportedRun]]
  }))
}
