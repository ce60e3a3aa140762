import { beforeEach, describe, expect, it, onTestFinished } from 'vitest'
import { startFakeMail, type FakeMail } from '../../fakes/mail/create-fake-mail.ts'
import { createSmtpMailer } from '../../server/integrations/mail/create-smtp-mailer.ts'
import { outside, setOutside } from '../../server/integrations/outside.ts'
import { Hold } from '../../server/models/jobs/hold.ts'
import { Link } from '../../server/models/people/link.ts'
import { receiveSample } from '../../server/services/samples/receive-sample.ts'
import { invitePerson } from '../../server/services/people/invite-person.ts'
import { askPasswordReset } from '../../server/services/people/links/ask-password-reset.ts'
import { sendLink } from '../../worker/tasks/send-link.ts'
import { tellOfHold } from '../../worker/tasks/tell-of-hold.ts'
import { startTestApp } from '../support/app.ts'
import { buildHouse } from '../support/build/house.ts'
import { buildPerson } from '../support/build/people.ts'
import { buildLab, buildWork } from '../support/build/runs.ts'
import { callerFor } from '../support/caller.ts'
import { runTask, runTwice } from '../support/task.ts'

const app = await startTestApp()
let fake: FakeMail

beforeEach(async () => {
  fake = await startFakeMail()
  const mail = createSmtpMailer({ url: fake.smtpUrl, from: 'lab@tarnwick.example', timeoutMs: 3000 })
  setOutside({ ...outside(), mail })
  onTestFinished(async () => { mail.close(); await fake.stop() })
})

const invite = async () => {
  const { manager, site } = await buildHouse()
  return invitePerson({ name: 'Alex Tarn', email: `alex.${site.id.slice(-12)}@people.example`, role: 'technician', siteId: site.id, customerId: null }, await callerFor(manager))
}
const linkIn = (text: string) => /\/links\/([A-Za-z0-9_-]+)/.exec(text)?.[1] ?? ''

describe('an invitation', () => {
  it('is mailed once, with a link that opens', async () => {
    const person = await invite()
    await runTwice(sendLink, 'person.invited', () => Promise.resolve(fake.messages().length))
    expect(fake.messages()).toMatchObject([{ to: [person.email], subject: 'Your account with Tarnwick Materials Testing' }])
    const { body } = await app.agent().get(`/api/links/${linkIn(fake.messages()[0]!.text)}`).expect(200)
    expect(body).toEqual({ purpose: 'invitation', email: person.email, name: 'Alex Tarn' })
  })

  it('is not mailed any more when its link is used up or too old', async () => {
    const person = await invite()
    await Link.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { personId: person.id } })
    await runTask(sendLink, 'person.invited')
    expect(fake.messages()).toEqual([])
  })
})

describe('a password reset', () => {
  it('is mailed to who asked, with a link that opens', async () => {
    const { client } = await buildHouse()
    await askPasswordReset(client.email, { address: '198.51.100.7', requestId: 'test' })
    await runTwice(sendLink, 'person.reset-asked', () => Promise.resolve(fake.messages().length))
    expect(fake.messages()).toMatchObject([{ to: [client.email], subject: 'Choose a new password' }])
    await app.agent().get(`/api/links/${linkIn(fake.messages()[0]!.text)}`).expect(200)
  })
})

describe('a hold', () => {
  const stop = async () => {
    const lab = await buildLab()
    const { job, samples } = await buildWork(lab)
    const mismatch = { reason: 'The stamp reads 7K4193, the order says 7K4192.', question: 'Which heat is it?', answers: ['7K4192', '7K4193'] }
    await receiveSample(samples[0]!.id, { version: samples[0]!.version, condition: '', mismatch }, await callerFor(lab.technician))
    return { lab, job, sample: samples[0]! }
  }

  it('is told to every active client of the customer, once, with where to answer', async () => {
    const { lab, job, sample } = await stop()
    const second = await buildPerson({ role: 'client', customerId: lab.customer.id })
    await buildPerson({ role: 'client', customerId: lab.customer.id, state: 'disabled' })
    await runTwice(tellOfHold, 'hold.placed', () => Promise.resolve(fake.messages().length))
    expect(fake.messages().flatMap(({ to }) => to).sort()).toEqual([lab.client.email, second.email].sort())
    expect(fake.messages()[0]?.subject).toBe(`Your answer is needed: sample ${sample.number}`)
    for (const words of ['Which heat is it?', '- 7K4193', `http://127.0.0.1:1/jobs/${job.id}`]) expect(fake.messages()[0]?.text).toContain(words)
  })

  it('is told to the others when one address fails, and to that one later', async () => {
    const { lab } = await stop()
    await buildPerson({ role: 'client', customerId: lab.customer.id })
    fake.failNext({ how: 'try-later' })
    await expect(runTask(tellOfHold, 'hold.placed')).rejects.toThrow('1 of 2 mails')
    expect(fake.messages()).toHaveLength(1)
    await runTask(tellOfHold, 'hold.placed')
    expect(fake.messages()).toHaveLength(2)
  })

  it('that was answered meanwhile is not told any more', async () => {
    const { job } = await stop()
    await Hold.update({ answer: '7K4192', answeredAt: new Date() }, { where: { jobId: job.id } })
    await runTask(tellOfHold, 'hold.placed')
    expect(fake.messages()).toEqual([])
  })
})
