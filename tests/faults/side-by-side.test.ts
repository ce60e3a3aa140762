import { QueryTypes } from 'sequelize'
import { expect, it } from 'vitest'
import { database } from '../../server/database/connection.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { verifyLedger } from '../../server/services/ledger/verify-ledger.ts'
import { startFaultHouse } from '../support/fault-house.ts'
import { until } from '../support/processes.ts'
import { carryOut, orderAndPay, reviewAndIssue } from '../support/story.ts'

const { house, stripe, signIn, startWorker, mailsTo } = await startFaultHouse({ apis: 2 })

it('two APIs and two workers play four stories at once, with each notice sent twice: nothing is lost and nothing is done twice', { timeout: 240_000 }, async () => {
  stripe.control.setWebhookMode('twice')
  startWorker()
  startWorker()
  const [client, technician, manager] = [await signIn(house.client), await signIn(house.technician, 1), await signIn(house.manager)]
  const jobs = await Promise.all(Array.from({ length: 4 }, () => orderAndPay(client, house, stripe, { count: 2 })))
  for (const job of jobs) await reviewAndIssue(manager, job.id, await carryOut(technician, job))
  await until('all reports are mailed', async () => (await ReportState.count({ where: { state: 'current' } })) === 4 && (await mailed()).length === 4, 120)

  expect(mailsTo(house.customer.reportEmail)).toHaveLength(4)
  expect(await Job.count({ where: { state: 'reported', money: 'paid' } })).toBe(4)
  const invoices = await database.query<{ number: string }>('select number from invoices order by number', { type: QueryTypes.SELECT })
  expect(invoices.map(({ number }) => Number(number.slice(-5)))).toEqual([1, 2, 3, 4])
  expect(stripe.control.refunds()).toEqual([])
  const { broken } = await verifyLedger()
  expect(broken).toBeNull()
  const late = await until('every task is done', async () => {
    const open = await database.query(`select task, state, error from task_deliveries where state <> 'done'`, { type: QueryTypes.SELECT })
    return open.length === 0 ? { open } : null
  }, 60)
  expect(late.open).toEqual([])
})

const mailed = () => database.query(`select id from report_states where mailed_at is not null`, { type: QueryTypes.SELECT })
