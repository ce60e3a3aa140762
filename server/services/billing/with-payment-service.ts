import { Problem } from '../../../shared/problems.ts'
import { PaymentError } from '../../integrations/payment/payment-error.ts'

/** Asks the payment service for a person; its refusals and silences become problems that say what is safe to do. */
export async function withPaymentService<T>(ask: () => Promise<T>): Promise<T> {
  try {
    return await ask()
  } catch (error) {
    if (!(error instanceof PaymentError)) throw error
    if (error.reason === 'bad-signature') throw new Problem('not-acceptable', 'this notice does not carry a valid signature')
    if (error.reason === 'unavailable') throw new Problem('unavailable', 'the payment service does not answer; nothing was taken twice, try again in a moment')
    throw new Problem('not-now', 'the payment service refused this; look at the job again')
  }
}
