import type { Caller } from '../../caller.ts'
import type { Tx } from '../../database/transaction.ts'
import { Sample } from '../../models/jobs/sample.ts'
import { loadOne, must } from '../../models/load.ts'
import { fileView } from './file-view.ts'
import { keepUpload, type Belonging, type Receive } from './keep-upload.ts'

/** A photo of a sample as it came, for the customer to see as well. */
export async function addPhoto(sampleId: string, receive: Receive, caller: Caller) {
  const belong = async (tx?: Tx): Promise<Belonging> => {
    const sample = await loadOne(Sample, 'Sample', sampleId, caller, { tx })
    must(caller, 'receive', 'Sample', sample)
    const { jobId, customerId, siteId } = sample
    return { jobId, customerId, siteId, sampleId, purpose: 'photo', visibleToCustomer: true }
  }
  await belong()
  return fileView(await keepUpload(receive, belong, caller, { onlyPictures: true }))
}
