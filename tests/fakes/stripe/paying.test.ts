import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { newCheckout, openFakeStripe, webhookSecret } from './open-fake-stripe.ts'

function press(url: string, action: string) {
  return fetch(url, { method: 'POST', body: new URLSearchParams({ action }), redirect: 'manual' })
}

describe('the payment page', () => {
  it('shows amount and lines, says that no money moves, and allows no script', async () => {
    const { stripe } = await openFakeStripe()
    const { url } = await stripe.checkout.sessions.create(newCheckout())
    const page = await fetch(url ?? '')
    const text = await page.text()
    expect(text).toContain('This is a stand-in for the payment service: no money moves')
    expect(text).toContain('€375.50')
    expect(text).toContain('Vickers hardness &#60;HV 10&#62;')
    expect(page.headers.get('content-security-policy')).toContain("default-src 'none'")
    expect(page.headers.get('content-security-policy')).toContain("form-action 'self' http://127.0.0.1:9")
  })

  it('pays: leads back with the id, and sends notices the SDK finds genuine', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id, url } = await stripe.checkout.sessions.create(newCheckout())
    const answer = await press(url ?? '', 'pay')
    expect([answer.status, answer.headers.get('location')]).toEqual([303, `http://127.0.0.1:9/paid?checkout=${id}`])
    await fake.control.settled()

    const events = receiver.notices.map(({ body, signature }) => stripe.webhooks.constructEvent(body, signature, webhookSecret))
    expect(events.map((event) => event.type).sort()).toEqual(['checkout.session.completed', 'payment_intent.succeeded'])
    const session = await stripe.checkout.sessions.retrieve(id, { expand: ['payment_intent'] })
    expect(session).toMatchObject({ status: 'complete', payment_status: 'paid', url: null, payment_intent: { status: 'succeeded', amount_received: 37550 } })
    expect(await stripe.events.retrieve(events[0]?.id ?? '')).toEqual(events[0])
  })

  it('charges once when Pay is pressed twice at the same time', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { url } = await stripe.checkout.sessions.create(newCheckout())
    const answers = await Promise.all([press(url ?? '', 'pay'), press(url ?? '', 'pay')])
    expect(answers.map((answer) => answer.status)).toEqual([303, 303])
    await fake.control.settled()
    expect(fake.control.payments()).toHaveLength(1)
    expect(receiver.notices).toHaveLength(2)
  })

  it('declines and stays open, and leaves without paying', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id, url } = await stripe.checkout.sessions.create(newCheckout())
    expect(await (await press(url ?? '', 'decline')).text()).toContain('The card was declined')
    expect((await press(url ?? '', 'leave')).headers.get('location')).toBe('http://127.0.0.1:9/left')
    expect(await stripe.checkout.sessions.retrieve(id)).toMatchObject({ status: 'open', payment_status: 'unpaid' })
    await fake.control.settled()
    expect(receiver.types()).toEqual(['payment_intent.payment_failed'])
    await press(url ?? '', 'pay')
    expect(fake.control.payments()).toMatchObject([{ status: 'succeeded', declined: false }])
  })

  it('takes nothing for an expired checkout', async () => {
    const { stripe, fake } = await openFakeStripe()
    const { id, url } = await stripe.checkout.sessions.create(newCheckout())
    fake.control.expire(id)
    expect((await press(url ?? '', 'pay')).status).toBe(409)
    expect(fake.control.payments()).toEqual([])
  })

  it('refuses a press that comes from another site', async () => {
    const { stripe, fake } = await openFakeStripe()
    const { url } = await stripe.checkout.sessions.create(newCheckout())
    const answer = await fetch(url ?? '', { method: 'POST', headers: { 'sec-fetch-site': 'cross-site' }, body: new URLSearchParams({ action: 'pay' }) })
    expect(answer.status).toBe(403)
    expect(fake.control.payments()).toEqual([])
  })
})

describe('refunds', () => {
  it('give back in parts, never more than was paid', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id } = await stripe.checkout.sessions.create(newCheckout())
    fake.control.pay(id)
    const paymentIntent = fake.control.payments()[0]?.id ?? ''
    const first = await stripe.refunds.create({ payment_intent: paymentIntent, amount: 10_000 }, { idempotencyKey: 'refund-1' })
    expect(first).toMatchObject({ status: 'succeeded', amount: 10_000, payment_intent: paymentIntent })
    expect((await stripe.refunds.create({ payment_intent: paymentIntent, amount: 10_000 }, { idempotencyKey: 'refund-1' })).id).toBe(first.id)
    await expect(stripe.refunds.create({ payment_intent: paymentIntent, amount: 27_551 })).rejects.toMatchObject({ param: 'amount', statusCode: 400 })
    await stripe.refunds.create({ payment_intent: paymentIntent })
    await expect(stripe.refunds.create({ payment_intent: paymentIntent })).rejects.toMatchObject({ code: 'charge_already_refunded' })

    const intent = await stripe.paymentIntents.retrieve(paymentIntent, { expand: ['latest_charge'] })
    expect(intent.latest_charge).toMatchObject({ amount_refunded: 37_550, refunded: true })
    expect((await stripe.refunds.list({ payment_intent: paymentIntent })).data.map((refund) => refund.amount)).toEqual([27_550, 10_000])
    await fake.control.settled()
    expect(receiver.types().filter((type) => type === 'charge.refunded')).toHaveLength(2)
  })

  it('are refused for a payment that never succeeded', async () => {
    const { stripe, fake } = await openFakeStripe()
    const { id } = await stripe.checkout.sessions.create(newCheckout())
    fake.control.decline(id)
    const [payment] = fake.control.payments()
    await expect(stripe.refunds.create({ payment_intent: payment?.id })).rejects.toMatchObject({ statusCode: 400 })
    await expect(stripe.refunds.create({ payment_intent: 'pi_unknown' })).rejects.toMatchObject({ code: 'resource_missing' })
  })
})

it('keeps everything over a restart: checkouts, keys, and what was not delivered', async () => {
  const stateFile = join(await mkdtemp(join(tmpdir(), 'fake-stripe-')), 'state.json')
  const before = await openFakeStripe({ stateFile, answers: [503, 503] })
  const key = { idempotencyKey: 'checkout-1' }
  const { id } = await before.stripe.checkout.sessions.create(newCheckout(), key)
  before.fake.control.pay(id)
  await before.fake.control.settled()
  await before.fake.stop()

  const after = await openFakeStripe({ stateFile, webhookUrl: before.receiver.url })
  expect(await after.stripe.checkout.sessions.retrieve(id)).toMatchObject({ status: 'complete', payment_status: 'paid' })
  expect((await after.stripe.checkout.sessions.create(newCheckout(), key)).id).toBe(id)
  await expect.poll(() => after.fake.control.events().map((event) => event.delivery.state), { timeout: 5000 }).toEqual(['delivered', 'delivered'])
  expect(before.receiver.notices).toHaveLength(4)
})
