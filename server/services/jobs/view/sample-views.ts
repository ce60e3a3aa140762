import { Op, QueryTypes, type Transaction } from 'sequelize'
import type { SampleInJob } from '../../../../shared/api/jobs.ts'
import { methodOf } from '../../../../shared/methods.ts'
import { sampleTraveller, type JobNow, type StepNow, type TestNow } from '../../../../shared/travellers/sample-traveller.ts'
import { sampleWords } from '../../../../shared/travellers/sample-words.ts'
import { database } from '../../../database/connection.ts'
import type { Sample } from '../../../models/jobs/sample.ts'
import { Step } from '../../../models/jobs/step.ts'
import { Test } from '../../../models/jobs/test.ts'
import { Result } from '../../../models/runs/result.ts'

type Planned = { stepId: string; startsAt: Date | null; bench: string | null }
type LastRun = { id: string; testId: string; state: string; acceptedAt: Date | null }

/** Samples of one job as people see them: where each one is, its tests and its traveller. Rows in the order given. */
export async function sampleViews(samples: readonly Sample[], job: JobNow & { siteName: string }, tx?: Transaction): Promise<SampleInJob[]> {
  const ids = samples.map(({ id }) => id)
  if (ids.length === 0) return []
  const where = { sampleId: { [Op.in]: ids } }
  const steps = await Step.findAll({ where, order: [['position', 'ASC']], raw: true, transaction: tx })
  const tests = await Test.findAll({ where, order: [['position', 'ASC']], raw: true, transaction: tx })
  const planned = new Map((await plannedSteps(ids, tx)).map((entry) => [entry.stepId, entry]))
  const runs = new Map((await lastRuns(ids, tx)).map((run) => [run.testId, run]))
  const accepted = [...runs.values()].filter(({ state }) => state === 'accepted').map(({ id }) => id)
  const results = await Result.findAll({ where: { testRunId: { [Op.in]: accepted } }, raw: true, transaction: tx })
  const resultOf = new Map(results.map((result) => [`${result.testRunId} ${result.key}`, result]))
  const mainResult = (test: Test) => {
    const main = resultOf.get(`${runs.get(test.id)?.id} ${methodOf(test.methodId)?.mainResult}`)
    return main ? { symbol: main.symbol, reported: main.reported } : null
  }
  const stepsOf = bySample(steps)
  const testsOf = bySample(tests)

  return samples.map((sample) => {
    const ownTests = testsOf.get(sample.id) ?? []
    const stepsNow = (stepsOf.get(sample.id) ?? []).map((step) => stepNow(step, planned.get(step.id)))
    const testsNow = ownTests.map((test) => testNow(test, runs.get(test.id)))
    const { id, number, heat, lot, material, piece, state, onHold, condition } = sample
    const receivedAt = sample.receivedAt?.toISOString() ?? null
    return {
      id, number, heat, lot, material, piece, state, onHold, condition, receivedAt,
      now: sampleWords(sample, stepsNow, testsNow),
      traveller: sampleTraveller({ job, sample: { state, onHold, receivedAt, place: job.siteName }, steps: stepsNow, tests: testsNow }),
      tests: ownTests.map((test) => ({
        id: test.id, methodId: test.methodId, label: test.label, summary: methodOf(test.methodId)?.summary(test.parameters) ?? '', state: test.state,
        parameters: test.parameters, requirement: test.requirement, mainResult: mainResult(test), runId: runs.get(test.id)?.id ?? null,
      })),
    }
  })
}

function bySample<R extends { sampleId: string }>(rows: readonly R[]): Map<string, R[]> {
  const groups = new Map<string, R[]>()
  for (const row of rows) groups.set(row.sampleId, [...(groups.get(row.sampleId) ?? []), row])
  return groups
}

/** A step's row and its place in the plan, as the traveller wants them. */
function stepNow({ id, label, type, testId, state, startedAt, endedAt }: Step, plan: Planned | undefined): StepNow {
  return { id, label, type, testId, state, startedAt: startedAt?.toISOString() ?? null, endedAt: endedAt?.toISOString() ?? null, plannedAt: plan?.startsAt?.toISOString() ?? null, place: plan?.bench ?? null }
}

function testNow({ id, state }: Test, run: LastRun | undefined): TestNow {
  return { id, state, sentBack: run?.state === 'sent back', acceptedAt: run?.acceptedAt?.toISOString() ?? null }
}

/** Where each step is or will be done: the bench it was started at, else the planned one. */
function plannedSteps(sampleIds: readonly string[], tx: Transaction | undefined): Promise<Planned[]> {
  return database.query<Planned>(
    `select s.id as "stepId", e.starts_at as "startsAt", b.name as bench
     from steps s left join plan_entries e on e.step_id = s.id left join benches b on b.id = coalesce(s.bench_id, e.bench_id)
     where s.sample_id = any($1)`,
    { bind: [sampleIds], type: QueryTypes.SELECT, transaction: tx },
  )
}

/** The newest run of each test that was not given up at the bench. */
function lastRuns(sampleIds: readonly string[], tx: Transaction | undefined): Promise<LastRun[]> {
  return database.query<LastRun>(
    `select distinct on (r.test_id) r.id, r.test_id as "testId", r.state, v.created_at as "acceptedAt"
     from test_runs r left join reviews v on v.test_run_id = r.id and v.outcome = 'accepted'
     where r.sample_id = any($1) and r.state <> 'stopped' order by r.test_id, r.number desc`,
    { bind: [sampleIds], type: QueryTypes.SELECT, transaction: tx },
  )
}
