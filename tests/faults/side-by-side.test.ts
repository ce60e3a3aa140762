import { QueryTypes } from 'sequelize'
import { afterAll, expect, it } from 'vitest'
import { startFakeMail } from '../../fakes/mail/create-fake-mail.ts'
import { startFakeStripe } from '../../fakes/stripe/create-fake-stripe.ts'
import { database } from '../../server/database/connection.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { verifyLedger } from '../../server/services/ledger/verify-ledger.ts'
import { freePort, startProcess, startRedis, until } from '../support/processes.ts'
import { buildWorkingHouse, carryOut, orderAndPay, reviewAndIssue, signIn } from '../support/story.ts'

const [redisPort, onePort, otherPort] = [await freePort(), await freePort(), await freePort()]
const mail = await startFakeMail({})
const stripe = await startFakeStripe({ webhookUrl: `http://127.0.0.1:${otherPort}/api/payments/notices`, secretKey: process.env.STRIPE_SECRET_KEY!, webhookSecret: process.env.STRIPE_WEBHOOK_SECRET!, retryDelaysMs: [300, 1000, 3000] })
const settingsAt = (port: number) => ({
  PORT: String(port), BASE_URL: `http://127.0.0.1:${port}`, REDIS_URL: `redis://127.0.0.1:${redisPort}`, STRIPE_API_BASE: stripe.url, SMTP_URL: mail.smtpUrl, WORKER_LOCK_MS: '3000', WORKER_SWEEP_MS: '1000', WORKER_AGAIN_SECONDS: '2',
})
const redis = await startRedis(redisPort)
const processes = [startProcess('server/index.ts', settingsAt(onePort)), startProcess('server/index.ts', settingsAt(otherPort)), startProcess('worker/index.ts', settingsAt(onePort)), startProcess('worker/index.ts', settingsAt(otherPort))]
const [one, other] = [`http://127.0.0.1:${onePort}`, `http://127.0.0.1:${otherPort}`]
for (const address of [one, other]) await until('the API answers', async () => (await fetch(`${address}/healthz`)).ok)
const house = await buildWorkingHouse()

afterAll(async () => {
  await Promise.all(processes.map((running) => running.stop()))
  await redis.kill()
  await stripe.stop()
  await mail.stop()
})

it('two APIs and two workers play four stories at once, with each notice sent twice: nothing is lost and nothing is done twice', { timeout: 240_000 }, async () => {
  stripe.control.setWebhookMode('twice')
  const client = await signIn(one, house.client)
  const technician = await signIn(other, house.technician)
  const manager = await signIn(one, house.manager)
  const jobs = await Promise.all(Array.from({ length: 4 }, () => orderAndPay(client, house, stripe, { count: 2 })))
  for (const job of jobs) await reviewAndIssue(manager, job.id, await carryOut(technician, job))
  await until('all reports are mailed', async () => (await ReportState.count({ where: { state: 'current' } })) === 4 && (await mailed()).length === 4, 120)

  expect(mail.messages().filter(({ to }) => JSON.stringify(to).includes(house.customer.reportEmail))).toHaveLength(4)
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
