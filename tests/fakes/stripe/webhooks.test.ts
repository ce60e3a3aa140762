import { describe, expect, it } from 'vitest'
import { newCheckout, openFakeStripe, webhookSecret } from './open-fake-stripe.ts'

describe('webhooks of the payment stand-in', () => {
  it('are tried again until they are accepted, and given up after the last pause', async () => {
    const { stripe, fake, receiver } = await openFakeStripe({ answers: [500, 302, 200], retryDelaysMs: [5, 5, 5] })
    fake.control.expire((await stripe.checkout.sessions.create(newCheckout())).id)
    await expect.poll(() => fake.control.events()[0]?.delivery).toMatchObject({ state: 'delivered', attempts: 3, lastAnswer: '200' })
    expect(new Set(receiver.notices.map((notice) => notice.body.toString())).size).toBe(1)

    const stubborn = await openFakeStripe({ answers: [500, 500, 500, 500], retryDelaysMs: [1, 1] })
    stubborn.fake.control.expire((await stubborn.stripe.checkout.sessions.create(newCheckout())).id)
    await expect.poll(() => stubborn.fake.control.events()[0]?.delivery).toMatchObject({ state: 'given-up', attempts: 3, lastAnswer: '500' })
  })

  it('can be held, and released late, in reverse and twice', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    fake.control.setWebhookMode('hold')
    fake.control.pay((await stripe.checkout.sessions.create(newCheckout())).id)
    await fake.control.settled()
    expect(receiver.notices).toEqual([])
    expect(await fake.control.release({ reversed: true, times: 2 })).toEqual(['200', '200', '200', '200'])
    expect(receiver.types()).toEqual(['checkout.session.completed', 'checkout.session.completed', 'payment_intent.succeeded', 'payment_intent.succeeded'])
    expect(await fake.control.release()).toEqual([])
  })

  it('can be dropped and sent by hand later', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    fake.control.setWebhookMode('drop')
    fake.control.expire((await stripe.checkout.sessions.create(newCheckout())).id)
    await fake.control.settled()
    expect(receiver.notices).toEqual([])
    const [event] = fake.control.events()
    expect(await fake.control.resend(event?.id ?? '')).toBe('200')
    expect(receiver.types()).toEqual(['checkout.session.expired'])
  })

  it.each([
    ['wrong-secret', /No signatures found matching/],
    ['changed-body', /No signatures found matching/],
    ['old', /Timestamp outside the tolerance zone/],
  ] as const)('can be forged (%s) in a way the SDK refuses', async (how, reason) => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id } = await stripe.checkout.sessions.create(newCheckout())
    await fake.control.forge(id, how)
    const [notice] = receiver.notices
    expect(JSON.parse(String(notice?.body))).toMatchObject({ type: 'checkout.session.completed', data: { object: { id, payment_status: 'paid' } } })
    expect(() => stripe.webhooks.constructEvent(notice?.body ?? '', notice?.signature ?? '', webhookSecret)).toThrow(reason)
    expect(await stripe.checkout.sessions.retrieve(id)).toMatchObject({ status: 'open', payment_status: 'unpaid' })
  })
})

describe('the control page and its commands', () => {
  const command = (url: string, path: string, body: unknown) =>
    fetch(`${url}/control/${path}`, { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) })

  it('work over HTTP as well', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id } = await stripe.checkout.sessions.create(newCheckout())
    expect((await fetch(`${fake.url}/healthz`)).status).toBe(200)
    await command(fake.url, 'webhooks', { mode: 'hold' })
    await command(fake.url, 'checkout', { checkoutId: id, action: 'pay' })
    const released: unknown = await (await command(fake.url, 'release', { reversed: true, times: 1 })).json()
    expect(released).toEqual({ ok: true, result: ['200', '200'] })
    expect(receiver.types()).toEqual(['checkout.session.completed', 'payment_intent.succeeded'])
    await command(fake.url, 'fail-next', { how: 'server-error', times: 2, path: '/v1/refunds' })
    expect(await (await fetch(`${fake.url}/control.json`)).json()).toMatchObject({ webhookMode: 'hold', plannedFaults: [{ how: 'server-error', times: 2 }], checkouts: [{ id, status: 'complete' }] })
    const page = await (await fetch(`${fake.url}/control`)).text()
    expect(page).toContain('J-26-00417')
    expect(page).toContain('checkout.session.completed')
  })

  it('say what is wrong with a command', async () => {
    const { fake } = await openFakeStripe()
    const wrong = await command(fake.url, 'webhooks', { mode: 'sometimes' })
    expect([wrong.status, await wrong.text()]).toEqual([400, expect.stringContaining('mode')])
    expect((await command(fake.url, 'checkout', { checkoutId: 'cs_unknown', action: 'pay' })).status).toBe(404)
  })
})
