import { expect, it } from 'vitest'
import { Job } from '../../server/models/jobs/job.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { startFaultHouse } from '../support/fault-house.ts'
import { until } from '../support/processes.ts'
import { carryOut, orderAndPay, reviewAndIssue } from '../support/story.ts'

const { house, stripe, signIn, startWorker, killRedis, startRedis, mailsTo } = await startFaultHouse()

it('without Redis people go on working, and when it is back, empty, the rest is done once', { timeout: 240_000 }, async () => {
  const worker = startWorker()
  await killRedis()
  const [client, technician, manager] = [await signIn(house.client), await signIn(house.technician), await signIn(house.manager)]
  const job = await orderAndPay(client, house, stripe)
  await reviewAndIssue(manager, job.id, await carryOut(technician, job))
  expect((await Job.findByPk(job.id, { raw: true }))!.state).toBe('reported')
  expect(mailsTo(house.customer.reportEmail)).toEqual([])

  await startRedis()
  await until('the report is mailed', async () => (await ReportState.findOne({ where: { state: 'current' }, raw: true }))?.mailedAt ?? null, 120)
  expect(mailsTo(house.customer.reportEmail)).toHaveLength(1)
  await worker.stop()
})
