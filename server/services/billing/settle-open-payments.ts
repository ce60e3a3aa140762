import { literal, Op } from 'sequelize'
import { Payment } from '../../models/billing/payment.ts'
import { settlePayment } from './settle-payment.ts'

const patienceMs = 60_000

/**
 * Asks about payments that have been open for more than a minute: notices get lost. Taken at random, so that a few that fail
 * never keep the rest waiting; the first failure is thrown after all were asked.
 */
export async function settleOpenPayments(limit = 50): Promise<void> {
  const waiting = await Payment.findAll({
    where: { state: 'open', createdAt: { [Op.lt]: new Date(Date.now() - patienceMs) } }, attributes: ['checkoutId'], order: literal('random()'), limit, raw: true,
  })
  const failures: unknown[] = []
  for (const { checkoutId } of waiting) {
    if (checkoutId) await settlePayment(checkoutId, { person: null, requestId: 'sweep:settle-open-payments' }).catch((error: unknown) => failures.push(error))
  }
  if (failures.length > 0) throw new Error(`${failures.length} of ${waiting.length} open payments could not be asked about`, { cause: failures[0] })
}
