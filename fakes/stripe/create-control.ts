import type { ApiContext } from './api/api-context.ts'
import type { Faults } from './api/faults.ts'
import { found } from './api/found.ts'
import { checkoutSession } from './wire/checkout-session.ts'
import type { Forgery, Webhooks } from './webhooks/create-webhooks.ts'

export type ControlOptions = ApiContext & {
  webhooks: Webhooks
  faults: Faults
  save: () => void
}

export type StripeControl = ReturnType<typeof createControl>

/** What tests and people can make the stand-in do. */
export function createControl({ state, payments, payUrl, webhooks, faults, save }: ControlOptions) {
  const one = (checkoutId: string) => found(state.checkouts, checkoutId, 'checkout.session')
  const testCard = '0013'
  return {
    checkouts: () => Object.values(state.checkouts),
    payments: () => Object.values(state.payments),
    refunds: () => Object.values(state.refunds),
    events: () => Object.values(state.events),

    /** As if the customer had pressed Pay; false when the checkout was closed already. */
    pay(checkoutId: string): boolean {
      const paid = payments.pay(one(checkoutId), testCard)
      save()
      return paid
    },
    decline(checkoutId: string): void {
      payments.decline(one(checkoutId), testCard)
      save()
    },
    /** As if its time had run out. */
    expire(checkoutId: string): void {
      payments.expire(one(checkoutId))
      save()
    },

    webhookMode: webhooks.mode,
    setWebhookMode: webhooks.setMode,
    setWebhookUrl: webhooks.setReceiver,
    /** Sends what was held; resolves with the receiver's answers in the order of sending. */
    release: webhooks.release,
    resend: webhooks.resend,
    /** A notice that claims the checkout was paid, with a signature that must be refused; nothing here changes. */
    forge(checkoutId: string, forgery: Forgery): Promise<string> {
      const claimed = { ...one(checkoutId), status: 'complete', paymentStatus: 'paid' } as const
      return webhooks.forge('checkout.session.completed', checkoutSession(claimed, payUrl(checkoutId)), forgery)
    },
    /** Resolves when no webhook is on its way. */
    settled: webhooks.settled,

    /** Makes the next calls of the API fail. */
    failNext: faults.add,
    plannedFaults: faults.planned,
    clearFaults: faults.clear,
  }
}
