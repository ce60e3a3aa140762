import { randomUUID } from 'node:crypto'
import { methodOf } from '../../../shared/methods.ts'
import { benchRefuses } from '../../../shared/planning/bench-refuses.ts'
import type { Caller } from '../../caller.ts'
import type { Sample } from '../../models/jobs/sample.ts'
import { Step } from '../../models/jobs/step.ts'
import { Test } from '../../models/jobs/test.ts'
import { Bench } from '../../models/sites/bench.ts'
import { finishStep } from '../../services/samples/finish-step.ts'
import { startStep } from '../../services/samples/start-step.ts'
import { recordRun } from '../../services/test-runs/record-run.ts'
import { reviewRun } from '../../services/test-runs/review-run.ts'
import { saveReadings } from '../../services/test-runs/save-readings.ts'
import { startRun } from '../../services/test-runs/start-run.ts'
import { demoReadings } from './demo-readings.ts'

type How = { bench: Caller; reviewer: Caller | null; stopAfter: number; seed: number }

/** Does every step of these samples in order, and has the runs reviewed where there is a reviewer. `stopAfter` steps a sample is left lying. */
export async function measureSamples(samples: readonly Sample[], { bench: technician, reviewer, stopAfter, seed }: How): Promise<void> {
  for (const [row, sample] of samples.entries()) {
    const steps = await Step.findAll({ where: { sampleId: sample.id }, order: [['position', 'ASC']], raw: true })
    for (const [at, step] of steps.entries()) {
      if (at >= stopAfter + (row % 3)) break
      const bench = await benchFor(step)
      if (!methodOf(step.capability)) {
        await startStep(step.id, bench.id, technician)
        await finishStep(step.id, { remark: '' }, technician)
        continue
      }
      const test = (await Test.findByPk(step.testId!, { raw: true }))!
      const run = await startRun(test.id, bench.id, technician)
      const keep = demoReadings(test.methodId, seed * 1000 + row * 10 + at).map((entry) => ({ ...entry, value: entry.value as never, key: randomUUID() }))
      const saved = await saveReadings(run.id, { version: run.version, keep, strike: [] }, technician)
      const recorded = await recordRun(run.id, { version: saved.version, remark: '' }, technician)
      if (reviewer) await reviewRun(run.id, { version: recorded.version, outcome: 'accepted', remark: '', readings: [] }, reviewer)
    }
  }
}

async function benchFor(step: Step): Promise<Bench> {
  const benches = await Bench.findAll({ where: { siteId: step.siteId }, order: [['code', 'ASC']], raw: true })
  const fits = benches.find(({ does }) => benchRefuses(does, step.need) === null)
  if (!fits) throw new Error(`no bench at the site takes ${step.label}`)
  return fits
}
