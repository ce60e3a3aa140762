import Stripe from 'stripe'
import { describe, expect, it } from 'vitest'
import { newCheckout, openFakeStripe, sdk } from './open-fake-stripe.ts'

describe('checkout sessions of the payment stand-in', () => {
  it('adds up the lines of a new checkout and gives it back by id', async () => {
    const { stripe, fake } = await openFakeStripe()
    const made = await stripe.checkout.sessions.create(newCheckout())
    expect(made.url).toBe(`${fake.url}/pay/${made.id}`)
    const fetched = await stripe.checkout.sessions.retrieve(made.id, { expand: ['line_items'] })
    expect(fetched).toMatchObject({ status: 'open', payment_status: 'unpaid', amount_total: 37550, currency: 'eur', client_reference_id: 'J-26-00417' })
    expect(fetched.line_items?.data.map((line) => [line.description, line.quantity, line.amount_total])).toEqual([
      ['Vickers hardness <HV 10>', 3, 25500],
      ['Tensile test', 1, 12050],
    ])
    expect(made.lastResponse.requestId).toMatch(/^req_/)
  })

  it('takes a hundred lines, the most the real service takes, and refuses one more', async () => {
    const { stripe } = await openFakeStripe()
    const line = { quantity: 1, price_data: { currency: 'eur', unit_amount: 100, product_data: { name: 'Section' } } }
    const made = await stripe.checkout.sessions.create(newCheckout({ line_items: Array.from({ length: 100 }, () => line) }))
    expect(made.amount_total).toBe(10_000)
    await expect(stripe.checkout.sessions.create(newCheckout({ line_items: Array.from({ length: 101 }, () => line) }))).rejects.toMatchObject({ param: 'line_items', statusCode: 400 })
  })

  it.each([
    [{ success_url: undefined }, { code: 'parameter_missing', param: 'success_url' }],
    [{ customer_email: 'not an address' }, { param: 'customer_email' }],
    [{ expires_at: 1_700_000_000 }, { param: 'expires_at' }],
    [{ locale: 'de' as const }, { code: 'parameter_unknown', param: 'locale' }],
    [{ line_items: [{ quantity: 0, price_data: { currency: 'eur', unit_amount: 1, product_data: { name: 'x' } } }] }, { param: 'line_items[0][quantity]' }],
    [{ line_items: [{ quantity: 1, price_data: { currency: 'eur', unit_amount: 49, product_data: { name: 'x' } } }] }, { code: 'amount_too_small' }],
  ])('refuses %j as the real service does', async (change, failure) => {
    const { stripe } = await openFakeStripe()
    const call = stripe.checkout.sessions.create(newCheckout(change))
    await expect(call).rejects.toBeInstanceOf(Stripe.errors.StripeInvalidRequestError)
    await expect(call).rejects.toMatchObject({ statusCode: 400, ...failure })
  })

  it('refuses a wrong key and an unknown id', async () => {
    const { stripe, fake } = await openFakeStripe()
    await expect(sdk(fake.port, { key: 'sk_test_other' }).checkout.sessions.list()).rejects.toBeInstanceOf(Stripe.errors.StripeAuthenticationError)
    await expect(stripe.checkout.sessions.retrieve('cs_test_unknown')).rejects.toMatchObject({ statusCode: 404, code: 'resource_missing' })
    await expect(stripe.checkout.sessions.retrieve('__proto__')).rejects.toMatchObject({ statusCode: 404 })
  })

  it('closes an open checkout once', async () => {
    const { stripe, fake, receiver } = await openFakeStripe()
    const { id } = await stripe.checkout.sessions.create(newCheckout())
    expect(await stripe.checkout.sessions.expire(id)).toMatchObject({ status: 'expired', url: null })
    await expect(stripe.checkout.sessions.expire(id)).rejects.toMatchObject({ statusCode: 400 })
    await fake.control.settled()
    expect(receiver.types()).toEqual(['checkout.session.expired'])
  })

  it('lists newest first, page by page', async () => {
    const { stripe } = await openFakeStripe()
    const ids: string[] = []
    for (let made = 0; made < 5; made += 1) ids.unshift((await stripe.checkout.sessions.create(newCheckout())).id)
    const listed: string[] = []
    for await (const session of stripe.checkout.sessions.list({ limit: 2 })) listed.push(session.id)
    expect(listed).toEqual(ids)
  })
})

describe('idempotency keys', () => {
  it('answer a repeat with the first answer and refuse the key for another request', async () => {
    const { stripe, fake } = await openFakeStripe()
    const key = { idempotencyKey: 'checkout-J-26-00417' }
    const first = await stripe.checkout.sessions.create(newCheckout(), key)
    const again = await stripe.checkout.sessions.create(newCheckout(), key)
    expect(again.id).toBe(first.id)
    expect(fake.control.checkouts()).toHaveLength(1)
    const other = stripe.checkout.sessions.create(newCheckout({ client_reference_id: 'J-26-00418' }), key)
    await expect(other).rejects.toBeInstanceOf(Stripe.errors.StripeIdempotencyError)
    await expect(other).rejects.toMatchObject({ statusCode: 400 })
  })

  it.each(['server-error', 'cut', 'timeout'] as const)('let the SDK try again after %s without a second checkout', async (how) => {
    const { fake } = await openFakeStripe()
    fake.control.failNext({ how })
    const made = await sdk(fake.port, { maxNetworkRetries: 1, timeout: 400 }).checkout.sessions.create(newCheckout())
    expect(fake.control.checkouts().map((checkout) => checkout.id)).toEqual([made.id])
    expect(fake.control.plannedFaults()).toEqual([])
  })

  it('tell a rate limit as one', async () => {
    const { fake, stripe } = await openFakeStripe()
    fake.control.failNext({ how: 'rate-limit', path: '/v1/checkout' })
    expect((await stripe.refunds.list()).data).toEqual([])
    await expect(stripe.checkout.sessions.create(newCheckout())).rejects.toBeInstanceOf(Stripe.errors.StripeRateLimitError)
    expect(fake.control.checkouts()).toEqual([])
  })
})
