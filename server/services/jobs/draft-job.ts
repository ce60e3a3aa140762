import { afterwardsChoices, type Order } from '../../../shared/api/orders.ts'
import { Problem } from '../../../shared/problems.ts'
import type { Caller } from '../../caller.ts'
import { inTransaction } from '../../database/transaction.ts'
import { Job } from '../../models/jobs/job.ts'
import { loadOne, must } from '../../models/load.ts'
import { nextNumber } from './next-number.ts'
import { columnsOf, orderTerms } from './order-terms.ts'
import { jobView } from './view/job-view.ts'

const empty: Order = { purchaseOrder: '', neededBy: null, afterwards: afterwardsChoices[0], siteId: null, columns: [], samples: [] }

/** Starts a draft, empty or with the samples and tests of an earlier job. */
export async function draftJob({ from }: { from?: string | undefined }, caller: Caller) {
  const { customerId, id: personId } = caller.person
  if (!customerId) throw new Problem('not-allowed', 'only a customer can order')
  must(caller, 'create', 'Job', { customerId })
  const row = await inTransaction(caller, async (tx) => {
    const earlier = from ? await loadOne(Job, 'Job', from, caller, { tx }) : null
    const order = earlier ? { ...earlier.order, purchaseOrder: '', neededBy: null } : empty
    const columns = columnsOf(order, await orderTerms(customerId, tx))
    const number = await nextNumber('J', new Date(), tx)
    const job = await Job.create({ ...columns, number, customerId, orderedById: personId, state: 'draft', money: 'unpaid' }, { transaction: tx })
    tx.record({ type: 'job.drafted', id: job.id, jobId: job.id, customerId, siteId: columns.siteId, data: { number, text: earlier ? `copied from ${earlier.number}` : '' } })
    return job.get({ plain: true })
  })
  return jobView(row.id, caller)
}
