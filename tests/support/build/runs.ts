import { randomUUID } from 'node:crypto'
import { Sample } from '../../../server/models/jobs/sample.ts'
import { Step } from '../../../server/models/jobs/step.ts'
import { Test } from '../../../server/models/jobs/test.ts'
import type { Job } from '../../../server/models/jobs/job.ts'
import type { Person } from '../../../server/models/people/person.ts'
import type { Bench } from '../../../server/models/sites/bench.ts'
import type { Equipment } from '../../../server/models/sites/equipment.ts'
import { finishStep } from '../../../server/services/samples/finish-step.ts'
import { receiveSample } from '../../../server/services/samples/receive-sample.ts'
import { startStep } from '../../../server/services/samples/start-step.ts'
import { recordRun } from '../../../server/services/test-runs/record-run.ts'
import { saveReadings } from '../../../server/services/test-runs/save-readings.ts'
import { startRun } from '../../../server/services/test-runs/start-run.ts'
import type { Order } from '../../../shared/api/orders.ts'
import type { SaveReadings, TestRun } from '../../../shared/api/test-runs.ts'
import { callerFor } from '../caller.ts'
import { buildBench, buildMachine, buildRight, hardnessAbility } from './benches.ts'
import { buildHouse, type House } from './house.ts'
import { buildOffers, buildOrder, buildPlacedJob } from './jobs.ts'
import { buildPerson } from './people.ts'

/** A house that can carry out Rockwell tests: a saw, a bench with its machine, the technician authorised, and a second one who may review. */
export type Lab = House & { cutting: Bench; hardness: Bench; machine: Equipment; reviewer: Person }

export async function buildLab(): Promise<Lab> {
  const house = await buildHouse()
  const { id } = house.site
  await buildOffers(id)
  const machine = await buildMachine(id)
  const reviewer = await buildPerson({ role: 'technician', siteId: id })
  for (const person of [house.technician, reviewer]) await buildRight(person, id, 'carry out')
  await buildRight(house.technician, id, 'review')
  await buildRight(reviewer, id, 'review')
  return { ...house, machine, reviewer, cutting: await buildBench(id, ['section']), hardness: await buildBench(id, [hardnessAbility], { equipmentId: machine.id }) }
}

export type Work = { job: Job; samples: Sample[]; tests: Test[]; steps: Step[] }

/** A placed job with everything that belongs to it, in order. */
export async function buildWork(lab: Pick<House, 'client' | 'site'>, order: Order = buildOrder({}, { count: 1 })): Promise<Work> {
  const job = await buildPlacedJob(lab, order)
  const of = { where: { jobId: job.id }, raw: true as const }
  const samples = await Sample.findAll({ ...of, order: [['position', 'ASC']] })
  return { job, samples, tests: await Test.findAll({ ...of, order: [['sampleId', 'ASC'], ['position', 'ASC']] }), steps: await Step.findAll({ ...of, order: [['sampleId', 'ASC'], ['position', 'ASC']] }) }
}

/** As `buildWork`, with every sample taken in. */
export async function buildArrived(lab: Lab, order?: Order): Promise<Work> {
  const work = await buildWork(lab, order)
  const technician = await callerFor(lab.technician)
  for (const sample of work.samples) await receiveSample(sample.id, { version: sample.version, condition: 'clean, dry', mismatch: null }, technician)
  return work
}

/** As `buildArrived`, with every sample cut, so that hardness can be measured. */
export async function buildReady(lab: Lab, order?: Order): Promise<Work> {
  const work = await buildArrived(lab, order)
  const technician = await callerFor(lab.technician)
  for (const { id } of work.steps.filter(({ capability }) => capability === 'section')) {
    await startStep(id, lab.cutting.id, technician)
    await finishStep(id, { remark: '' }, technician)
  }
  return work
}

/** The first test of a new job, at the bench. */
export async function buildOpenRun(lab: Lab, order?: Order): Promise<Work & { run: TestRun; test: Test }> {
  const work = await buildReady(lab, order)
  const test = work.tests[0]!
  return { ...work, test, run: await startRun(test.id, lab.hardness.id, await callerFor(lab.technician)) }
}

/** As `buildOpenRun`, measured and handed over for review. */
export async function buildRecordedRun(lab: Lab, order?: Order): Promise<Work & { run: TestRun; test: Test }> {
  const open = await buildOpenRun(lab, order)
  return { ...open, run: await measure(lab, open.run) }
}

/** Keeps three sound readings in an open run and records it. */
export async function measure(lab: Lab, run: TestRun): Promise<TestRun> {
  const technician = await callerFor(lab.technician)
  const saved = await saveReadings(run.id, { version: run.version, keep: hardnessReadings(), strike: [] }, technician)
  return recordRun(run.id, { version: saved.version, remark: '' }, technician)
}

/** Rows of a hardness set, far enough from one another and from the edge. */
export function hardnessReadings(values: readonly number[] = [31.2, 31.6, 31.4], from = 0): SaveReadings['keep'] {
  return values.map((value, at) => ({ key: randomUUID(), path: `readings.${from + at}`, value: { value, xMm: 4 + (from + at) * 3, yMm: 6, edgeMm: 6 } }))
}
