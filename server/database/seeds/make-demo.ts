import { Job } from '../../models/jobs/job.ts'
import { demoJobs } from './demo-jobs.ts'
import { makeHouse } from './make-house.ts'
import { makeJob } from './make-job.ts'

/** Fills an empty database with the demonstration company and its work; does nothing where there is a company with jobs already. */
export async function makeDemo(): Promise<void> {
  await makeHouse()
  if ((await Job.count()) > 0) return
  for (const [at, job] of demoJobs.entries()) await makeJob(job, at + 1)
}
