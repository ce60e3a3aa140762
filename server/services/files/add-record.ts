import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'
import { TestRun } from '../../models/runs/test-run.ts'
import { fileView } from './file-view.ts'
import { keepUpload, type Belonging, type Receive } from './keep-upload.ts'

/** The file of a measured record, kept beside the readings taken from it; the lab's own. */
export async function addRecord(testRunId: string, receive: Receive, caller: Caller) {
  const belong = async (tx?: Tx): Promise<Belonging> => {
    const run = await loadOne(TestRun, 'TestRun', testRunId, caller, { tx, lock: tx !== undefined })
    must(caller, 'record', 'TestRun', run)
    if (run.state !== 'open') throw new Problem('not-now', `this run is ${run.state}; records are added while it is open`)
    const { jobId, sampleId, siteId } = run
    const { customerId } = await loadOne(Job, 'Job', jobId, caller, { tx })
    return { jobId, customerId, siteId, sampleId, testRunId, purpose: 'record', visibleToCustomer: false }
  }
  await belong()
  return fileView(await keepUpload(receive, belong, caller))
}
