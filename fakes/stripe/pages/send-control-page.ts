import type { Response } from 'express'
import { html, type Html } from '../../page/html.ts'
import { sendPage } from '../../page/send-page.ts'
import { faultKinds } from '../api/faults.ts'
import type { StripeControl } from '../create-control.ts'
import type { CheckoutRecord, EventRecord } from '../stripe-state.ts'
import { forgeries, webhookModes } from '../webhooks/create-webhooks.ts'
import { money } from './money.ts'

const shown = 50
const modeNames = { send: 'send at once', hold: 'hold until released', drop: 'drop', twice: 'send twice' }
const forgeryNames = { 'wrong-secret': 'wrong secret', 'changed-body': 'changed body', old: 'an hour old' }
const faultNames = { 'rate-limit': '429, nothing done', 'server-error': '500, nothing done', timeout: 'no answer, work done', cut: 'connection cut, work done' }

/** The page where a person makes the stand-in misbehave. */
export function sendControlPage(res: Response, control: StripeControl): void {
  const checkouts = control.checkouts().reverse().slice(0, shown)
  const events = control.events().reverse().slice(0, shown)
  const held = control.events().filter((event) => event.delivery.state === 'held').length
  sendPage(res, {
    title: 'Payment stand-in',
    body: html`
<h1>Payment stand-in</h1>
<p class="note">This is a stand-in for the payment service: no money moves.</p>
<h2>Webhooks</h2>
<form class="sheet" method="post" action="/control/webhooks"><div class="row">
<div><label for="mode">New webhooks</label><select id="mode" name="mode">${webhookModes.map((mode) => option(mode, modeNames[mode], mode === control.webhookMode()))}</select></div>
<button>Set</button></div></form>
<form class="sheet" method="post" action="/control/release"><div class="row">
<div><label for="order">${held} held, release</label><select id="order" name="reversed">${option('false', 'in order')}${option('true', 'newest first')}</select></div>
<div><label for="times">Each sent</label><select id="times" name="times">${option('1', 'once')}${option('2', 'twice')}</select></div>
<button>Release</button></div></form>
<h2>The next calls of the API</h2>
<form class="sheet" method="post" action="/control/fail-next"><div class="row">
<div><label for="how">Answer</label><select id="how" name="how">${faultKinds.map((kind) => option(kind, faultNames[kind]))}</select></div>
<div><label for="count">How many calls</label><input id="count" name="times" type="number" min="1" max="100" value="1"></div>
<button>Plan</button></div></form>
${
  control.plannedFaults().length === 0
    ? html`<p class="quiet">None planned.</p>`
    : html`<ul>${control.plannedFaults().map((fault) => html`<li>${faultNames[fault.how]}, ${fault.times} to come, on ${fault.path}</li>`)}</ul>
<form method="post" action="/control/clear-faults"><button>Clear</button></form>`
}
<h2>Checkouts</h2>
${checkouts.length === 0 ? html`<p class="quiet">None yet: one appears when somebody starts to pay.</p>` : checkoutTable(checkouts)}
<h2>Events</h2>
${events.length === 0 ? html`<p class="quiet">None yet: they follow from payments and refunds.</p>` : eventTable(events)}
<p class="quiet">The newest ${shown} of each. All of it is at <a href="/control.json">/control.json</a>.</p>`,
  })
}

function checkoutTable(checkouts: CheckoutRecord[]): Html {
  return html`<div class="scroll wide"><table>
<thead><tr><th>Reference</th><th>State</th><th>Amount</th><th>Do</th></tr></thead>
<tbody>${checkouts.map(
    (checkout) => html`<tr>
<td>${checkout.reference ?? 'none'}<br><span class="quiet code">${checkout.id.slice(0, 20)}…</span></td>
<td class="fixed">${checkout.status}, ${checkout.paymentStatus}</td>
<td class="fixed">${money(checkout.amountTotal, checkout.currency)}</td>
<td>${checkout.status === 'open' ? html`<a href="/pay/${checkout.id}">Open</a> ${(['pay', 'decline', 'expire'] as const).map((action) => checkoutForm(checkout.id, action))}` : ''}
${forgeries.map((how) => button('forge', { checkoutId: checkout.id, how }, `Forge: ${forgeryNames[how]}`))}</td>
</tr>`,
  )}</tbody></table></div>`
}

function checkoutForm(checkoutId: string, action: 'pay' | 'decline' | 'expire'): Html {
  return button('checkout', { checkoutId, action }, { pay: 'Pay', decline: 'Decline', expire: 'Expire' }[action])
}

function eventTable(events: EventRecord[]): Html {
  return html`<div class="scroll wide"><table>
<thead><tr><th>Event</th><th>Webhook</th><th>Attempts</th><th>Last answer</th><th>Do</th></tr></thead>
<tbody>${events.map(
    (event) => html`<tr>
<td>${event.type}<br><span class="quiet code">${event.id}</span></td>
<td class="fixed">${event.delivery.state}</td><td>${event.delivery.attempts}</td><td>${event.delivery.lastAnswer ?? ''}</td>
<td>${button('resend', { eventId: event.id }, 'Send again')}</td></tr>`,
  )}</tbody></table></div>`
}

function button(path: string, fields: Record<string, string>, label: string): Html {
  return html`<form method="post" action="/control/${path}">${Object.entries(fields).map(
    ([name, value]) => html`<input type="hidden" name="${name}" value="${value}">`,
  )}<button>${label}</button></form>`
}

function option(value: string, label: string, selected = false): Html {
  return selected ? html`<option value="${value}" selected>${label}</option>` : html`<option value="${value}">${label}</option>`
}
