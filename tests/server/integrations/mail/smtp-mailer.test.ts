import { createHash, randomBytes } from 'node:crypto'
import { createServer, type AddressInfo } from 'node:net'
import { Readable } from 'node:stream'
import { expect, it, onTestFinished } from 'vitest'
import { startFakeMail } from '../../../../fakes/mail/create-fake-mail.ts'
import { createSmtpMailer } from '../../../../server/integrations/mail/create-smtp-mailer.ts'
import type { Mail } from '../../../../server/integrations/mail/mailer.ts'

async function open() {
  const fake = await startFakeMail()
  const mailer = createSmtpMailer({ url: fake.smtpUrl, from: 'Crosshead Works <reports@lab.example>', timeoutMs: 3000 })
  onTestFinished(async () => {
    mailer.close()
    await fake.stop()
  })
  return { fake, mailer }
}

const report: Mail = {
  to: 'quality@brackwater.example',
  subject: 'Report R-26-00417/1: Härte 250 HV 10 ± 7',
  text: 'The report is attached.',
  html: '<p>The report is <b>attached</b>.</p>',
  messageId: '<report-R-26-00417-1@lab.example>',
}

it('delivers text, HTML and an attachment unchanged', async () => {
  const { fake, mailer } = await open()
  const pdf = randomBytes(300_000)
  await mailer.send({ ...report, attachments: [{ filename: 'R-26-00417-1 Prüfbericht.pdf', contentType: 'application/pdf', content: Readable.from([pdf]) }] })
  expect(fake.messages()).toMatchObject([
    {
      to: [report.to],
      from: '"Crosshead Works" <reports@lab.example>',
      subject: report.subject,
      messageId: report.messageId,
      html: report.html,
      attachments: [{ name: 'R-26-00417-1 Prüfbericht.pdf', contentType: 'application/pdf', size: 300_000, sha256: createHash('sha256').update(pdf).digest('hex') }],
    },
  ])
  expect(fake.messages()[0]?.text.trim()).toBe(report.text)
})

it('sends a repeat under the same Message-ID, so that it can be recognised', async () => {
  const { fake, mailer } = await open()
  fake.failNext({ how: 'lose-answer' })
  await expect(mailer.send(report)).rejects.toMatchObject({ name: 'MailError', reason: 'unavailable' })
  await mailer.send(report)
  expect(fake.messages().map((mail) => mail.messageId)).toEqual([report.messageId, report.messageId])
})

it('tells a refusal for good from one for now', async () => {
  const { fake, mailer } = await open()
  fake.failNext({ how: 'refuse' })
  await expect(mailer.send(report)).rejects.toMatchObject({ reason: 'refused' })
  fake.failNext({ how: 'try-later' })
  await expect(mailer.send(report)).rejects.toMatchObject({ reason: 'unavailable' })
  expect(fake.messages()).toEqual([])
})

it.each([
  ['two recipients', { to: 'a@lab.example, b@elsewhere.example' }, /^to:/],
  ['a header in the subject', { subject: 'Report\r\nBcc: b@elsewhere.example' }, /^subject:/],
  ['a Message-ID without brackets', { messageId: 'report-1@lab.example' }, /^messageId:/],
])('refuses %s before anything is sent', async (_name, change, message) => {
  const { fake, mailer } = await open()
  const send = mailer.send({ ...report, ...change })
  await expect(send).rejects.toMatchObject({ reason: 'refused' })
  await expect(send).rejects.toThrow(message)
  expect(fake.messages()).toEqual([])
})

it('gives up on a server that says nothing', async () => {
  const silent = createServer().listen(0, '127.0.0.1')
  await new Promise((resolve) => silent.once('listening', resolve))
  const { port } = silent.address() as AddressInfo
  const mailer = createSmtpMailer({ url: `smtp://127.0.0.1:${port}`, from: 'reports@lab.example', timeoutMs: 100 })
  onTestFinished(() => {
    mailer.close()
    silent.close()
  })
  await expect(mailer.send(report)).rejects.toMatchObject({ reason: 'unavailable' })
})
