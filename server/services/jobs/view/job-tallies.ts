import { QueryTypes } from 'sequelize'
import type { StepKind } from '../../../../shared/method/method.ts'
import type { SampleTally, StepTally, TestTally } from '../../../../shared/travellers/job-traveller.ts'
import { database } from '../../../database/connection.ts'

export type JobTallies = { samples: SampleTally; steps: StepTally[]; tests: TestTally }

/** How far the samples of many jobs are, counted in the database: a page of a list may stand for thousands of steps. */
export async function jobTallies(jobIds: readonly string[]): Promise<Map<string, JobTallies>> {
  const tallies = new Map(jobIds.map((id): [string, JobTallies] => [id, { samples: { total: 0, received: 0, missing: 0 }, steps: [], tests: { total: 0, recorded: 0, accepted: 0 } }]))
  if (jobIds.length === 0) return tallies
  const ask = <R extends object>(sql: string) => database.query<R & { jobId: string }>(sql, { bind: [jobIds], type: QueryTypes.SELECT })
  for (const { jobId, ...samples } of await ask<SampleTally>(`
    select job_id as "jobId", count(*) as total, count(received_at) as received, count(*) filter (where state = 'missing' or (on_hold and received_at is null)) as missing
    from samples where job_id = any($1) and state <> 'void' group by job_id`)) Object.assign(tallies.get(jobId) ?? {}, { samples })
  for (const { jobId, ...tests } of await ask<TestTally>(`
    select job_id as "jobId", count(*) as total, count(*) filter (where state = 'recorded') as recorded, count(*) filter (where state in ('accepted', 'reported')) as accepted
    from tests where job_id = any($1) and state <> 'void' group by job_id`)) Object.assign(tallies.get(jobId) ?? {}, { tests })
  // a hold stops the first step of its sample that is not done; a test whose last run was sent back has to be done again
  for (const { jobId, ...step } of await ask<StepTally & { type: StepKind }>(`
    select job_id as "jobId", label, type, count(*) as total, count(*) filter (where state = 'done' and not again) as done, count(*) filter (where state = 'started') as started,
      count(*) filter (where on_hold and position = next) as held, count(*) filter (where again and state <> 'started') as "sentBack"
    from (
      select s.job_id, s.label, s.type, s.state, s.position, a.on_hold, min(s.position) filter (where s.state <> 'done') over (partition by s.sample_id) as next,
        s.type in ('measure', 'pull') and coalesce((select r.state = 'sent back' from test_runs r where r.test_id = s.test_id and r.state <> 'stopped' order by r.number desc limit 1), false) as again
      from steps s join samples a on a.id = s.sample_id where s.job_id = any($1) and s.state <> 'void'
    ) as standing group by job_id, label, type order by max(position), min(position), label`)) tallies.get(jobId)?.steps.push(step)
  return tallies
}
