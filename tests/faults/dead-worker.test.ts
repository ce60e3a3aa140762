import { Op } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { File } from '../../server/models/jobs/file.ts'
import { Job } from '../../server/models/jobs/job.ts'
import { Plan } from '../../server/models/jobs/plan.ts'
import { Report } from '../../server/models/reports/report.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import type { Sample } from '../../shared/api/samples.ts'
import { ageClaims, holdRow, someoneSends, someoneWaits, startFaultHouse } from '../support/fault-house.ts'
import { until } from '../support/processes.ts'
import { carryOut, orderAndPay, reviewAndIssue } from '../support/story.ts'

const { house, mail, stripe, signIn, startWorker, killRedis, startRedis, mailsTo } = await startFaultHouse()
const [client, technician, manager] = await Promise.all([signIn(house.client), signIn(house.technician), signIn(house.manager)])

const messageIds = (address: string) => new Set(mailsTo(address).map(({ messageId }) => messageId))

describe('a worker killed in the middle of', () => {
  it('planning: the next one makes the plan', { timeout: 120_000 }, async () => {
    const job = await orderAndPay(client, house, stripe)
    await Plan.findOrCreate({ where: { siteId: house.site.id }, defaults: { siteId: house.site.id, madeAt: new Date(0), ledgerId: 0 } })
    const release = await holdRow(`select * from plans where site_id = '${house.site.id}' for update`)
    const first = startWorker()
    await someoneWaits()
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
    await someoneWaits()
    await first.kill()
    await release()

    mail.failNext({ how: 'delay', times: 1, delayMs: 15_000 })
    const second = startWorker()
    await until('the report is made', async () => (await ReportState.findOne({ where: { reportId: report.id, state: 'current' }, raw: true })) !== null)
    await someoneSends()
    await second.kill()
    await killRedis()
    await startRedis()
    mail.clearFaults()
    await ageClaims()

    const third = startWorker()
    const state = await until('the report is mailed', async () => ReportState.findOne({ where: { reportId: report.id, mailedAt: { [Op.ne]: null } }, raw: true }), 90)
    expect(state.mailedTo).toBe(house.customer.reportEmail)
    expect(await File.count({ where: { jobId: job.id, purpose: 'report' } })).toBe(1)
    expect(messageIds(house.customer.reportEmail).size).toBe(1)
    await third.stop()
  })

  it('a refund: the money goes back once', { timeout: 120_000 }, async () => {
    const job = await orderAndPay(client, house, stripe)
    stripe.control.failNext({ how: 'timeout', times: 1, path: '/v1/refunds' })
    const first = startWorker()
    const { body: seen } = await client.get(`/api/jobs/${job.id}`)
    await client.post(`/api/jobs/${job.id}/cancel`).send({ version: seen.version, reason: 'ordered twice' }).expect(200)
    await until('the refund is asked for', () => stripe.control.refunds().length > 0, 30)
    await first.kill()
    stripe.control.clearFaults()
    const second = startWorker()
    await until('the refund is noted', async () => (await Job.findByPk(job.id, { raw: true }))!.money === 'refunded', 60)
    expect(stripe.control.refunds()).toHaveLength(1)
    await second.stop()
  })

  const mails: [string, string, () => Promise<unknown>][] = [
    ['the mail of a password link', house.manager.email, () => client.post('/api/password-resets').send({ email: house.manager.email }).expect(200)],
    ['the mail of a hold', house.client.email, async () => {
      const job = await orderAndPay(client, house, stripe)
      const { body } = await technician.get(`/api/samples/${job.samples[0]!.id}`)
      const mismatch = { reason: 'the stamp is not the ordered heat', question: 'which is right?', answers: ['the stamp'] }
      await technician.post(`/api/samples/${job.samples[0]!.id}/receive`).send({ version: (body as Sample).version, condition: 'undamaged', mismatch }).expect(200)
    }],
  ]
  it.each(mails)('%s: it arrives, and a repeat is the same message', { timeout: 120_000 }, async (_what, address, happen) => {
    const before = messageIds(address).size
    mail.failNext({ how: 'delay', times: 1, delayMs: 15_000 })
    const first = startWorker()
    await happen()
    await someoneSends()
    await first.kill()
    mail.clearFaults()
    await ageClaims()
    const second = startWorker()
    await until('the mail has arrived', () => messageIds(address).size === before + 1, 60)
    await second.stop()
    expect(messageIds(address).size).toBe(before + 1)
  })
})
