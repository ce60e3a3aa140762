import { createHmac } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { createStripeGateway, type StripeGatewayOptions } from '../../../../server/integrations/payment/create-stripe-gateway.ts'
import type { NewCheckout } from '../../../../server/integrations/payment/payment-gateway.ts'
import { openFakeStripe, secretKey, webhookSecret } from '../../../fakes/stripe/open-fake-stripe.ts'

async function open(options: Partial<StripeGatewayOptions> = {}) {
  const { fake, receiver } = await openFakeStripe()
  return { fake, receiver, gateway: createStripeGateway({ secretKey, webhookSecret, apiBase: fake.url, timeoutMs: 500, ...options }) }
}

const newCheckout: NewCheckout = {
  reference: 'J-26-00417',
  lines: [
    { name: 'Charpy V-notch impact', amountMinor: 4200, quantity: 3 },
    { name: 'Section and mount', amountMinor: 1999, quantity: 1 },
  ],
  currency: 'EUR',
  customerEmail: 'buyer@brackwater.example',
  successUrl: 'http://127.0.0.1:9/paid?checkout={CHECKOUT_SESSION_ID}',
  cancelUrl: 'http://127.0.0.1:9/left',
  idempotencyKey: 'checkout J-26-00417 1',
}

describe('the payment gateway', () => {
  it('starts a checkout, learns that it was paid, and gives part of it back once', async () => {
    const { fake, gateway } = await open()
    const { id, url } = await gateway.createCheckout(newCheckout)
    expect(await gateway.fetchCheckout(id)).toEqual({ id, status: 'open', paid: false, paymentIntentId: null, amountMinor: 14_599, currency: 'EUR', reference: 'J-26-00417', url })
    await fetch(url, { method: 'POST', body: new URLSearchParams({ action: 'pay' }), redirect: 'manual' })
    const paid = await gateway.fetchCheckout(id)
    expect(paid).toMatchObject({ status: 'complete', paid: true, amountMinor: 14_599, url: null })

    const request = { paymentIntentId: paid.paymentIntentId ?? '', amountMinor: 1999, idempotencyKey: 'refund 1' }
    const refund = await gateway.refund(request)
    expect(refund).toMatchObject({ status: 'succeeded', amountMinor: 1999 })
    expect(await gateway.refund(request)).toEqual(refund)
    expect(await gateway.fetchRefund(refund.id)).toEqual(refund)
    expect(fake.control.payments()).toMatchObject([{ amountRefunded: 1999, metadata: { reference: 'J-26-00417' } }])
    await expect(gateway.refund({ ...request, amountMinor: 20_000, idempotencyKey: 'refund 2' })).rejects.toMatchObject({ name: 'PaymentError', reason: 'not-acceptable' })
  })

  it('closes a checkout, and says so when it was paid before it could be closed', async () => {
    const { fake, gateway } = await open()
    const first = await gateway.createCheckout({ ...newCheckout, expiresAt: new Date(Date.now() + 31 * 60_000) })
    expect(await gateway.expireCheckout(first.id)).toMatchObject({ status: 'expired', paid: false, url: null })
    expect(await gateway.expireCheckout(first.id)).toMatchObject({ status: 'expired' })
    const second = await gateway.createCheckout({ ...newCheckout, idempotencyKey: 'second' })
    fake.control.pay(second.id)
    expect(await gateway.expireCheckout(second.id)).toMatchObject({ status: 'complete', paid: true })
  })

  it.each(['server-error', 'timeout', 'cut'] as const)('makes one checkout although the first answer is %s', async (how) => {
    const { fake, gateway } = await open()
    fake.control.failNext({ how })
    const { id } = await gateway.createCheckout(newCheckout)
    expect(fake.control.checkouts().map((checkout) => checkout.id)).toEqual([id])
  })

  it('tells what can be tried again from what cannot', async () => {
    const { fake, gateway } = await open({ maxNetworkRetries: 0 })
    await expect(gateway.fetchCheckout('cs_test_unknown')).rejects.toMatchObject({ reason: 'not-found' })
    await expect(gateway.createCheckout({ ...newCheckout, customerEmail: 'nobody' })).rejects.toMatchObject({ reason: 'not-acceptable' })
    fake.control.failNext({ how: 'rate-limit' })
    await expect(gateway.createCheckout(newCheckout)).rejects.toMatchObject({ reason: 'unavailable' })
    await fake.stop()
    await expect(gateway.fetchCheckout('cs_test_any')).rejects.toMatchObject({ reason: 'unavailable' })
  })
})

describe('a payment notice', () => {
  it('is read when its signature is good, also by the second of two secrets', async () => {
    const { fake, receiver, gateway } = await open({ webhookSecret: `whsec_next, ${webhookSecret}` })
    const { id } = await gateway.createCheckout(newCheckout)
    fake.control.pay(id)
    await fake.control.settled()
    const notices = receiver.notices.map(({ body, signature }) => gateway.readNotice(body, signature))
    const { paymentIntentId } = await gateway.fetchCheckout(id)
    expect(notices.find((notice) => notice.type === 'checkout.session.completed')).toMatchObject({ checkoutId: id, paymentIntentId })
    const succeeded = notices.find((notice) => notice.type === 'payment_intent.succeeded')
    expect(succeeded).toMatchObject({ paymentIntentId })
    expect(succeeded).not.toHaveProperty('checkoutId')
    expect(Math.abs(Date.now() - Number(succeeded?.created))).toBeLessThan(10_000)
  })

  it.each(['wrong-secret', 'changed-body', 'old'] as const)('is refused when forged: %s', async (how) => {
    const { fake, receiver, gateway } = await open()
    const { id } = await gateway.createCheckout(newCheckout)
    await fake.control.forge(id, how)
    const [notice] = receiver.notices
    expect(() => gateway.readNotice(notice?.body ?? Buffer.of(), notice?.signature ?? '')).toThrow(expect.objectContaining({ name: 'PaymentError', reason: 'bad-signature' }))
  })

  it.each([['nothing', ''], ['rubbish', 'rubbish'], ['no time', 'v1=00'], ['no signature', 't=1']])('is refused with %s for a signature', async (_name, signature) => {
    const { gateway } = await open()
    expect(() => gateway.readNotice(Buffer.from('{}'), signature)).toThrow(expect.objectContaining({ reason: 'bad-signature' }))
  })

  it('is refused when it is signed but is no event', async () => {
    const { gateway } = await open()
    const sign = (body: string) => {
      const seconds = Math.floor(Date.now() / 1000)
      return `t=${seconds},v1=${createHmac('sha256', webhookSecret).update(`${seconds}.${body}`).digest('hex')}`
    }
    expect(() => gateway.readNotice(Buffer.from('{"id":1}'), sign('{"id":1}'))).toThrow(expect.objectContaining({ reason: 'not-acceptable' }))
  })
})
