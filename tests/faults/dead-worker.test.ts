import { Op } from 'sequelize'
import { afterAll, describe, expect, it } from 'vitest'
import { startFakeMail } from '../../fakes/mail/create-fake-mail.ts'
import { startFakeStripe } from '../../fakes/stripe/create-fake-stripe.ts'
import { database } from '../../server/database/connection.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { Plan } from '../../server/models/jobs/plan.ts'
import { Report } from '../../server/models/reports/report.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { File } from '../../server/models/jobs/file.ts'
import { freePort, startProcess, startRedis, until } from '../support/processes.ts'
import { buildWorkingHouse, carryOut, orderAndPay, reviewAndIssue, signIn } from '../support/story.ts'

const redisPort = await freePort()
const apiPort = await freePort()
const mail = await startFakeMail({})
const stripe = await startFakeStripe({ webhookUrl: `http://127.0.0.1:${apiPort}/api/payments/notices`, secretKey: process.env.STRIPE_SECRET_KEY!, webhookSecret: process.env.STRIPE_WEBHOOK_SECRET!, retryDelaysMs: [300, 1000, 3000] })
const settings = {
  PORT: String(apiPort), BASE_URL: `http://127.0.0.1:${apiPort}`, REDIS_URL: `redis://127.0.0.1:${redisPort}`, STRIPE_API_BASE: stripe.url, SMTP_URL: mail.smtpUrl,
  WORKER_LOCK_MS: '2000', WORKER_SWEEP_MS: '1000', WORKER_AGAIN_SECONDS: '3',
}
let redis = await startRedis(redisPort)
const api = startProcess('server/index.ts', settings)
const address = `http://127.0.0.1:${apiPort}`
await until('the API answers', async () => (await fetch(`${address}/healthz`)).ok)
const house = await buildWorkingHouse()
const [client, technician, manager] = await Promise.all([signIn(address, house.client), signIn(address, house.technician), signIn(address, house.manager)])

afterAll(async () => {
  await api.stop()
  await redis.kill()
  await stripe.stop()
  await mail.stop()
})

const startWorker = () => startProcess('worker/index.ts', settings)

/** Holds a row so that a task stops in the middle of its work, until `release` is called. */
async function holdRow(sql: string): Promise<() => Promise<void>> {
  const transaction = await database.transaction()
  await database.query(sql, { transaction })
  return () => transaction.commit()
}

/** A worker that waits for a lock in the database: it is in the middle of a task. */
const blocked = () => until('a worker waits for the held row', async () => {
  const [rows] = await database.query(`select 1 from pg_stat_activity where wait_event_type = 'Lock' and datname = current_database()`)
  return rows.length > 0
})

describe('a worker killed in the middle of', () => {
  it('planning: the next one makes the plan', { timeout: 120_000 }, async () => {
    const job = await orderAndPay(client, house, stripe)
    await Plan.findOrCreate({ where: { siteId: house.site.id }, defaults: { siteId: house.site.id, madeAt: new Date(0), ledgerId: 0 } })
    const release = await holdRow(`select * from plans where site_id = '${house.site.id}' for update`)
    const first = startWorker()
    await blocked()
    await first.kill()
    await release()
    expect((await Job.findByPk(job.id, { raw: true }))!.state).toBe('placed')
    const second = startWorker()
    await until('the job is planned', async () => (await Job.findByPk(job.id, { raw: true }))!.state === 'awaiting samples')
    await second.stop()
  })

  it('making and mailing a report: one file, one mail, and Redis may be lost as well', { timeout: 240_000 }, async () => {
    const job = await orderAndPay(client, house, stripe)
    const issued = await reviewAndIssue(manager, job.id, await carryOut(technician, job))
    const report = (await Report.findOne({ where: { jobId: job.id }, raw: true }))!
    expect(issued.reports).toHaveLength(1)

    const release = await holdRow(`select * from report_states where report_id = '${report.id}' for update`)
    const first = startWorker()
    await blocked()
    await first.kill()
    await release()

    mail.failNext({ how: 'delay', times: 1, delayMs: 15_000 })
    const second = startWorker()
    await until('the report is made', async () => (await ReportState.findOne({ where: { reportId: report.id, state: 'current' }, raw: true })) !== null)
    await until('a mail is being sent', async () => { const [rows] = await database.query(`select 1 from mails where state = 'sending'`); return rows.length > 0 })
    await second.kill()
    await redis.kill()
    redis = await startRedis(redisPort)
    mail.clearFaults()
    await database.query(`update mails set claimed_at = claimed_at - interval '10 minutes' where state = 'sending'`)

    const third = startWorker()
    const state = await until('the report is mailed', async () => ReportState.findOne({ where: { reportId: report.id, mailedAt: { [Op.ne]: null } }, raw: true }), 90)
    expect(state.mailedTo).toBe(house.customer.reportEmail)
    expect(await File.count({ where: { jobId: job.id, purpose: 'report' } })).toBe(1)
    const ids = mail.messages().filter(({ to }) => JSON.stringify(to).includes(house.customer.reportEmail)).map(({ messageId }) => messageId)
    expect(new Set(ids).size).toBe(1)
    await third.stop()
  })

  it('a refund: the money goes back once', { timeout: 120_000 }, async () => {
    const job = await orderAndPay(client, house, stripe)
    stripe.control.failNext({ how: 'timeout', times: 1, path: '/v1/refunds' })
    const first = startWorker()
    const { body: seen } = await client.get(`/api/jobs/${job.id}`)
    await client.post(`/api/jobs/${job.id}/cancel`).send({ version: seen.version, reason: 'ordered twice' }).expect(200)
    await until('the refund is asked for', async () => stripe.control.refunds().length > 0, 30)
    await first.kill()
    stripe.control.clearFaults()
    const second = startWorker()
    await until('the refund is noted', async () => (await Job.findByPk(job.id, { raw: true }))!.money === 'refunded', 60)
    expect(stripe.control.refunds()).toHaveLength(1)
    await second.stop()
  })
})
