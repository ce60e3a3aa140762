export type CheckoutLine = {
  name: string
  /** Price of one, in the currency's smallest unit. */
  amountMinor: number
  quantity: number
}

export type NewCheckout = {
  /** Our own name for what is paid (a job or an invoice); comes back with the checkout. At most 200 characters. */
  reference: string
  lines: CheckoutLine[]
  /** ISO 4217, either case. */
  currency: string
  customerEmail: string
  /** `{CHECKOUT_SESSION_ID}` in it is replaced by the checkout's id. */
  successUrl: string
  cancelUrl: string
  /** 30 minutes to 24 hours from now; 24 hours when left out. Part of the request, so a repeat must name the same time. */
  expiresAt?: Date
  idempotencyKey: string
}

export type Checkout = {
  id: string
  status: 'open' | 'complete' | 'expired'
  /** The only field to trust before crediting money; `complete` alone does not mean paid. */
  paid: boolean
  paymentIntentId: string | null
  amountMinor: number
  /** ISO 4217, upper case. */
  currency: string
  reference: string | null
  /** Where the customer pays; null once the checkout is closed. */
  url: string | null
}

export type RefundRequest = {
  paymentIntentId: string
  amountMinor: number
  idempotencyKey: string
}

export type RefundStatus = 'pending' | 'requires_action' | 'succeeded' | 'failed' | 'canceled'

export type Refund = {
  id: string
  status: RefundStatus
  amountMinor: number
  paymentIntentId: string | null
}

/** What a notice says is a hint: store its id once, then fetch the truth. */
export type PaymentNotice = {
  id: string
  type: string
  /** Set for notices about a checkout. */
  checkoutId?: string
  /** Set when the notice's subject belongs to a payment. */
  paymentIntentId?: string
  created: Date
}

/** Card payments through a page of the payment service. Every failure is a `PaymentError`. */
export type PaymentGateway = {
  createCheckout(checkout: NewCheckout): Promise<{ id: string; url: string }>
  fetchCheckout: (id: string) => Promise<Checkout>
  /** Closes an open checkout and returns it as it then is; one that was paid or closed in the meantime is returned unchanged. */
  expireCheckout: (id: string) => Promise<Checkout>
  refund: (request: RefundRequest) => Promise<Refund>
  fetchRefund: (id: string) => Promise<Refund>
  /** Checks the signature over the raw body and its age (five minutes); throws `PaymentError` with `bad-signature`. */
  readNotice: (rawBody: Buffer, signature: string) => PaymentNotice
}
