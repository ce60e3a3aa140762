import { describe, expect, it, onTestFinished } from 'vitest'
import { startFakeMail } from '../../fakes/mail/create-fake-mail.ts'
import { createSmtpMailer } from '../../server/integrations/mail/create-smtp-mailer.ts'
import { outside, setOutside } from '../../server/integrations/outside.ts'
import { Mail } from '../../server/models/reports/mail.ts'
import { ReportState } from '../../server/models/reports/report-state.ts'
import { deliverReport } from '../../worker/tasks/deliver-report.ts'
import { startTestApp } from '../support/app.ts'
import { buildOrder } from '../support/build/jobs.ts'
import { buildIssuedReport } from '../support/build/reports.ts'
import { buildLab } from '../support/build/runs.ts'
import { eventsOf } from '../support/events.ts'
import { runAtOnce, runTask, runTwice } from '../support/task.ts'

await startTestApp()
const stateOf = (reportId: string) => ReportState.findOne({ where: { reportId }, raw: true, rejectOnEmpty: true })

async function start() {
  const fake = await startFakeMail()
  const mail = createSmtpMailer({ url: fake.smtpUrl, from: 'Tarnwick Materials Testing <lab@tarnwick.example>', timeoutMs: 3000 })
  setOutside({ ...outside(), mail })
  onTestFinished(async () => { mail.close(); await fake.stop() })
  const lab = await buildLab()
  return { fake, lab, ...(await buildIssuedReport(lab, buildOrder({}, { count: 1 }))) }
}

describe('the task', () => {
  it('mails the file as it is kept, once, and notes it', async () => {
    const { fake, lab, report } = await start()
    await runTwice(deliverReport, 'report.issued', async () => [await stateOf(report.id), fake.messages().length])
    const state = await stateOf(report.id)
    expect(fake.messages()).toMatchObject([{
      to: [lab.customer.reportEmail], subject: `Test report ${report.number}/1, your order BF-88213`, messageId: `<report.${report.id}@127.0.0.1>`,
      attachments: [{ name: `${report.number}-1.pdf`, contentType: 'application/pdf', sha256: state.sha256 }],
    }])
    expect(fake.messages()[0]?.text).toContain(`http://127.0.0.1:1/check\nreport ${report.number}/1, code ${report.code}`)
    expect(state).toMatchObject({ mailedTo: lab.customer.reportEmail, mailedAt: expect.any(Date) })
    expect((await eventsOf(report.id)).filter(({ type }) => type === 'report.mailed')).toHaveLength(1)
  })

  it('mails once when two workers do it at once, and the other finds it done later', async () => {
    const { fake, report } = await start()
    await runAtOnce(deliverReport, 'report.issued')
    await runTask(deliverReport, 'report.issued')
    expect(fake.messages()).toHaveLength(1)
    expect((await eventsOf(report.id)).filter(({ type }) => type === 'report.mailed')).toHaveLength(1)
  })

  it('tries again after a refusal for now, without waiting for its own claim', async () => {
    const { fake, report } = await start()
    fake.failNext({ how: 'try-later' })
    await expect(runTask(deliverReport, 'report.issued')).rejects.toMatchObject({ reason: 'unavailable' })
    expect(await stateOf(report.id)).toMatchObject({ mailedAt: null })
    await runTask(deliverReport, 'report.issued')
    expect(fake.messages()).toHaveLength(1)
  })

  it('leaves a fresh claim to the worker that has it, and takes over one whose worker died', async () => {
    const { fake, report, lab } = await start()
    const key = `report:${report.id}`
    await Mail.create({ key, recipient: lab.customer.reportEmail, subject: 'x', state: 'sending', claimedAt: new Date(Date.now() - 60_000) })
    await expect(runTask(deliverReport, 'report.issued')).rejects.toThrow('is being sent by another worker')
    expect(fake.messages()).toEqual([])
    await Mail.update({ claimedAt: new Date(Date.now() - 121_000) }, { where: { key } })
    await runTask(deliverReport, 'report.issued')
    expect(fake.messages()).toHaveLength(1)
    expect(await Mail.findOne({ where: { key }, raw: true })).toMatchObject({ state: 'sent' })
  })

  it('notes a mail that was sent just before its worker died, and does not send it again', async () => {
    const { fake, report, lab } = await start()
    await Mail.create({ key: `report:${report.id}`, recipient: lab.customer.reportEmail, subject: 'x', state: 'sent', claimedAt: new Date(), sentAt: new Date() })
    await runTask(deliverReport, 'report.issued')
    expect(fake.messages()).toEqual([])
    expect(await stateOf(report.id)).toMatchObject({ mailedTo: lab.customer.reportEmail })
  })
})
