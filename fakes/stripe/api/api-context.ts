import type { Payments } from '../payments/payments.ts'
import type { StripeState } from '../stripe-state.ts'

/** What every endpoint works with. */
export type ApiContext = {
  state: StripeState
  payments: Payments
  payUrl: (checkoutId: string) => string
}
