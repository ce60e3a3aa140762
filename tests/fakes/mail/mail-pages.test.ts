import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { expect, it, onTestFinished } from 'vitest'
import { startFakeMail, type FakeMailOptions } from '../../../fakes/mail/create-fake-mail.ts'
import { createSmtpMailer } from '../../../server/integrations/mail/create-smtp-mailer.ts'

async function open(options: FakeMailOptions = {}) {
  const fake = await startFakeMail(options)
  const mailer = createSmtpMailer({ url: fake.smtpUrl, from: 'reports@lab.example' })
  onTestFinished(async () => {
    mailer.close()
    await fake.stop()
  })
  const send = (subject: string, html = '<p>Hello</p>') =>
    mailer.send({ to: 'buyer@brackwater.example', subject, text: 'Hello', html, messageId: `<${subject.replace(/\W/g, '-')}@lab.example>`, attachments: [{ filename: 'a.csv', contentType: 'text/csv', content: Buffer.from('1,2\n') }] })
  return { fake, send, get: (path: string) => fetch(`${fake.pageUrl}${path}`) }
}

it('lists messages newest first, on a page that loads itself again without script', async () => {
  const { send, get } = await open()
  expect(await (await get('/')).text()).toContain('No mail yet')
  await send('First <one>')
  await send('Second')
  const page = await get('/')
  const text = await page.text()
  expect(text.indexOf('Second')).toBeLessThan(text.indexOf('First &#60;one&#62;'))
  expect(text).toContain('http-equiv="refresh"')
  expect(page.headers.get('content-security-policy')).toContain("default-src 'none'")
  const list: unknown = await (await get('/messages.json')).json()
  expect(list).toMatchObject([{ subject: 'Second' }, { subject: 'First <one>', to: ['buyer@brackwater.example'], attachments: [{ name: 'a.csv', size: 4 }] }])
  expect(JSON.stringify(list)).not.toContain('"content"')
})

it('shows HTML in a frame without rights and gives attachments as downloads', async () => {
  const { fake, send, get } = await open()
  await send('Hostile', '<script>alert(1)</script><img src="http://elsewhere.example/pixel">')
  const id = fake.messages()[0]?.id ?? ''
  expect(await (await get(`/messages/${id}`)).text()).toContain('<iframe sandbox=""')
  const frame = await get(`/messages/${id}/html`)
  expect(frame.headers.get('content-security-policy')).toMatch(/^sandbox; default-src 'none'/)
  const file = await get(`/messages/${id}/attachments/0`)
  expect([file.headers.get('content-disposition'), file.headers.get('content-type'), await file.text()]).toEqual(['attachment; filename=a.csv', 'application/octet-stream', '1,2\n'])
  expect((await get('/messages/unknown')).status).toBe(404)
  expect((await get(`/messages/${id}/attachments/7`)).status).toBe(404)
})

it('keeps messages over a restart', async () => {
  const stateDir = await mkdtemp(join(tmpdir(), 'fake-mail-'))
  const before = await open({ stateDir })
  await before.send('Kept')
  const [kept] = before.fake.messages()
  await before.fake.stop()
  const after = await open({ stateDir })
  expect(after.fake.messages()).toEqual([kept])
})

it('refuses or delays the next messages when told to over HTTP', async () => {
  const { fake, send, get } = await open()
  const tell = (path: string, body: unknown) => fetch(`${fake.pageUrl}/control/${path}`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) })
  expect((await get('/healthz')).status).toBe(200)
  await tell('next', { how: 'try-later' })
  await tell('next', { how: 'delay', delayMs: 150 })
  await expect(send('Refused')).rejects.toThrow('451')
  const start = performance.now()
  await send('Late')
  expect(performance.now() - start).toBeGreaterThan(145)
  expect(fake.messages().map((mail) => mail.subject)).toEqual(['Late'])
  expect((await tell('next', { how: 'perhaps' })).status).toBe(400)
  await tell('next', { how: 'refuse', times: 9 })
  await tell('clear', {})
  await send('Taken')
})
