import { Router, urlencoded, type Response } from 'express'
import * as z from 'zod'
import { html } from '../../page/html.ts'
import { sendPage } from '../../page/send-page.ts'
import type { ApiContext } from '../api/api-context.ts'
import type { CheckoutRecord } from '../stripe-state.ts'
import { money } from './money.ts'

// Invented: no bank issues cards that begin with 99.
const card = { number: '9900 0000 0000 0013', expires: '12 / 49', code: '000', holder: 'Sample Holder' }
const last4 = card.number.slice(-4)

const Action = z.strictObject({ action: z.enum(['pay', 'decline', 'leave']) })

/** `/pay/:id`: the page a customer is sent to, and what its buttons do. */
export function payRoutes({ state, payments, save }: ApiContext & { save: () => void }): Router {
  const router = Router()
  const find = (id: string): CheckoutRecord | undefined => {
    if (payments.expireOverdue()) save()
    return Object.hasOwn(state.checkouts, id) ? state.checkouts[id] : undefined
  }

  router.get('/:id', (req, res) => {
    const checkout = find(req.params.id)
    if (!checkout) return sendClosed(res, 'There is no such payment', 'The address is not complete, or the payment was never started.', 404)
    if (checkout.status === 'complete') return sendClosed(res, 'Already paid', 'This payment went through before. Nothing was charged twice.')
    if (checkout.status === 'expired') return sendClosed(res, 'No longer open', 'This payment ran out of time or was closed. Start it again from where you came.')
    sendPayPage(res, checkout, '')
  })

  router.post('/:id', urlencoded({ extended: false, limit: '10kb' }), (req, res) => {
    const checkout = find(req.params.id)
    const form = Action.safeParse(req.body)
    if (!checkout) return sendClosed(res, 'There is no such payment', 'The address is not complete, or the payment was never started.', 404)
    if (!form.success) return sendClosed(res, 'Not understood', 'Go back and press one of the buttons.', 400)
    if (form.data.action === 'leave') return checkout.cancelUrl ? res.redirect(303, checkout.cancelUrl) : sendClosed(res, 'Nothing was paid', 'You can close this page.')
    if (checkout.status === 'expired') return sendClosed(res, 'No longer open', 'Nothing was charged. Start the payment again from where you came.', 409)
    if (form.data.action === 'decline' && checkout.status === 'open') {
      payments.decline(checkout, last4)
      save()
      return sendPayPage(res, checkout, 'The card was declined. Nothing was charged. Try again, or leave.')
    }
    payments.pay(checkout, last4)
    save()
    res.redirect(303, checkout.successUrl.replaceAll('{CHECKOUT_SESSION_ID}', checkout.id))
  })
  return router
}

function sendPayPage(res: Response, checkout: CheckoutRecord, failure: string): void {
  const total = money(checkout.amountTotal, checkout.currency)
  sendPage(res, {
    title: `Pay ${total}`,
    narrow: true,
    // A browser holds a form's redirects to this list as well.
    formTargets: [checkout.successUrl, checkout.cancelUrl ?? checkout.successUrl].map((url) => new URL(url).origin),
    body: html`
<p class="note">This is a stand-in for the payment service: no money moves.</p>
<div class="sheet">
<h1>Pay by card</h1>
<p class="amount">${total}</p>
${failure === '' ? '' : html`<p class="bad" role="alert">${failure}</p>`}
<table>
<thead><tr><th>For</th><th class="num">Amount</th></tr></thead>
<tbody>${checkout.lines.map(
      (line) => html`<tr><td>${line.name}${line.quantity > 1 ? html`<br><span class="quiet">${line.quantity} × ${money(line.unitAmount, checkout.currency)}</span>` : ''}</td>
<td class="num">${money(line.unitAmount * line.quantity, checkout.currency)}</td></tr>`,
    )}</tbody>
<tfoot><tr><td>Total</td><td class="num">${total}</td></tr></tfoot>
</table>
<form method="post" action="/pay/${checkout.id}">
<label for="number">Card number</label><input id="number" value="${card.number}" readonly aria-describedby="invented">
<div class="pair">
<div><label for="expires">Valid until</label><input id="expires" value="${card.expires}" readonly></div>
<div><label for="code">Security code</label><input id="code" value="${card.code}" readonly></div>
</div>
<label for="holder">Name on the card</label><input id="holder" value="${card.holder}" readonly>
<p class="quiet" id="invented">An invented card, filled in and fixed, so that nobody types a real one here.</p>
<button class="main" name="action" value="pay">Pay ${total}</button>
<div class="row"><button name="action" value="decline">Decline</button><button name="action" value="leave">Leave</button></div>
</form>
</div>
<p class="quiet">${checkout.reference ?? ''}${checkout.customerEmail ? html` for ${checkout.customerEmail}` : ''}</p>`,
  })
}

function sendClosed(res: Response, title: string, text: string, status = 200): void {
  sendPage(res, { title, narrow: true, status, body: html`<p class="note">This is a stand-in for the payment service: no money moves.</p><div class="sheet"><h1>${title}</h1><p>${text}</p></div>` })
}
