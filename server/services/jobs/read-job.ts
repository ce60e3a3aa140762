import type { Job } from '../../../shared/api/jobs.ts'
import type { Caller } from '../../caller.ts'
import { jobView } from './view/job-view.ts'

/** One job with its samples, holds, messages, files, reports and money. */
export async function readJob(jobId: string, caller: Caller): Promise<Job> {
  return jobView(jobId, caller)
}
