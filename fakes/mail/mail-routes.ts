import { json, Router, urlencoded, type Response } from 'express'
import * as z from 'zod'
import { html } from '../page/html.ts'
import { sendPage } from '../page/send-page.ts'
import { MailFault, mailFaultKinds, type MailFaults } from './mail-faults.ts'
import type { MailStore, ReceivedMail } from './mail-store.ts'

const faultNames = { refuse: 'refuse for good (550)', 'try-later': 'refuse for now (451)', delay: 'take late', 'lose-answer': 'take, but report failure' }
const shown = 200

/** The pages and `/messages.json`. */
export function mailRoutes(store: MailStore, faults: MailFaults): Router {
  const router = Router()
  const find = (id: string) => store.all().find((mail) => mail.id === id)

  router.get('/', (_req, res) => sendList(res, store.all().slice(-shown).reverse(), faults))
  router.get('/messages.json', (_req, res) => {
    res.json([...store.all()].reverse().map(summary))
  })
  router.get('/messages/:id', (req, res) => {
    const mail = find(req.params.id)
    return mail ? sendMail(res, mail) : sendMissing(res)
  })
  router.get('/messages/:id/html', (req, res) => {
    const mail = find(req.params.id)
    if (mail?.html == null) return sendMissing(res)
    // A page of its own with no rights at all, wherever it is opened: no script, no forms, nothing loaded from outside.
    res.set('content-security-policy', "sandbox; default-src 'none'; style-src 'unsafe-inline'; img-src data:; frame-ancestors 'self'").type('html').send(mail.html)
  })
  router.get('/messages/:id/attachments/:index', (req, res) => {
    const attachment = find(req.params.id)?.attachments[Number(req.params.index)]
    if (!attachment) return sendMissing(res)
    res.attachment(attachment.name).type('application/octet-stream').send(attachment.content)
  })

  router.use('/control', json({ limit: '10kb' }), urlencoded({ extended: false, limit: '10kb' }))
  router.post('/control/next', (req, res) => {
    const fault = MailFault.safeParse(req.body)
    if (!fault.success) return void res.status(400).json({ error: z.prettifyError(fault.error) })
    faults.add(fault.data)
    if (req.is('json')) res.json({ ok: true })
    else res.redirect(303, '/')
  })
  router.post('/control/clear', (req, res) => {
    faults.clear()
    if (req.is('json')) res.json({ ok: true })
    else res.redirect(303, '/')
  })
  return router
}

function summary(mail: ReceivedMail) {
  const { attachments, ...rest } = mail
  return { ...rest, attachments: attachments.map(({ name, contentType, size, sha256 }) => ({ name, contentType, size, sha256 })) }
}

function sendList(res: Response, mails: ReceivedMail[], faults: MailFaults): void {
  sendPage(res, {
    title: `Mail (${mails.length})`,
    refreshSeconds: 5,
    body: html`
<h1>Mail</h1>
<p class="note">This is a stand-in for a mail server: what is sent stays here and reaches nobody.</p>
${
  mails.length === 0
    ? html`<div class="sheet"><p>No mail yet. It appears here as soon as some is sent.</p></div>`
    : html`<div class="sheet scroll"><table><thead><tr><th>Subject</th><th>To</th><th>Received</th></tr></thead>
<tbody>${mails.map(
        (mail) => html`<tr><td><a href="/messages/${mail.id}">${mail.subject || '(no subject)'}</a>${attached(mail)}</td>
<td>${mail.to.join(', ')}</td><td>${time(mail.receivedAt)}</td></tr>`,
      )}</tbody></table></div>`
}
<h2>The next messages</h2>
<p class="quiet">${faults.planned().length === 0 ? 'Taken as usual.' : faults.planned().map((fault) => `${fault.times} × ${faultNames[fault.how]}`).join(', then ')}</p>
${mailFaultKinds.map(
  (how) => html`<form class="row" method="post" action="/control/next"><input type="hidden" name="how" value="${how}"><button>${`Next one: ${faultNames[how]}`}</button></form>`,
)}
<form class="row" method="post" action="/control/clear"><button>Take all as usual</button></form>`,
  })
}

function attached(mail: ReceivedMail) {
  return mail.attachments.length === 0 ? '' : html`<br><span class="quiet">${mail.attachments.map((attachment) => attachment.name).join(', ')}</span>`
}

function sendMail(res: Response, mail: ReceivedMail): void {
  sendPage(res, {
    title: mail.subject || '(no subject)',
    body: html`
<p><a href="/">All mail</a></p>
<h1>${mail.subject || '(no subject)'}</h1>
<div class="sheet"><table><tbody>
<tr><th>From</th><td>${mail.from}</td></tr>
<tr><th>To</th><td>${mail.to.join(', ')}</td></tr>
<tr><th>Received</th><td>${time(mail.receivedAt)}</td></tr>
<tr><th>Message-ID</th><td class="code">${mail.messageId}</td></tr>
</tbody></table></div>
${
  mail.attachments.length === 0
    ? ''
    : html`<h2>Attachments</h2><div class="sheet scroll"><table><thead><tr><th>Name</th><th class="num">Bytes</th></tr></thead>
<tbody>${mail.attachments.map(
        (attachment, index) => html`<tr><td><a href="/messages/${mail.id}/attachments/${index}">${attachment.name}</a><br><span class="quiet code">sha256 ${attachment.sha256}</span></td>
<td class="num">${attachment.size}</td></tr>`,
      )}</tbody></table></div>`
}
<h2>Text</h2><div class="sheet"><pre>${mail.text}</pre></div>
${mail.html === null ? '' : html`<h2>HTML</h2><iframe sandbox="" title="The message as HTML" src="/messages/${mail.id}/html"></iframe>`}`,
  })
}

function sendMissing(res: Response): void {
  sendPage(res, { title: 'Not here', status: 404, body: html`<h1>Not here</h1><p>There is no such message. <a href="/">All mail</a></p>` })
}

function time(date: Date): string {
  return `${date.toISOString().slice(0, 19).replace('T', ' ')} UTC`
}
