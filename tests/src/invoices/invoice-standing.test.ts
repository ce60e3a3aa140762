import { describe, expect, it } from 'vitest'
import { invoiceStanding } from '../../../src/components/billing/invoice-standing.ts'

const invoice = { totalMinor: 10000, paidMinor: 0, refundedMinor: 0, currency: 'GBP' as const }

describe('how an invoice stands', () => {
  it('is to pay while nothing came', () => expect(invoiceStanding(invoice)).toBe('to pay'))
  it('names what came of it', () => expect(invoiceStanding({ ...invoice, paidMinor: 4000 })).toBe('paid £40.00 of it'))
  it('is paid', () => expect(invoiceStanding({ ...invoice, paidMinor: 10000 })).toBe('paid'))
  it('names what went back', () => expect(invoiceStanding({ ...invoice, paidMinor: 10000, refundedMinor: 2500 })).toBe('refunded £25.00'))
  it('is refunded when all went back', () => expect(invoiceStanding({ ...invoice, paidMinor: 10000, refundedMinor: 10000 })).toBe('refunded'))
})
