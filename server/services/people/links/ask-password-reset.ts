import { setTimeout as sleep } from 'node:timers/promises'
import { inTransaction } from '../../../database/transaction.ts'
import { limits } from '../../../integrations/limits/limits.ts'
import { Person } from '../../../models/people/person.ts'
import { makeLink } from './make-link.ts'

/** Longer than all that is done for a known address, so that the time tells nothing. */
const answerAfterMs = 250

/** Makes a reset link for the person with this address; the task mails it. Answers the same when there is no such person. */
export async function askPasswordReset(email: string, { address, requestId }: { address: string; requestId: string }): Promise<{ sent: true }> {
  await limits().spend('resetsOfAddress', address)
  await limits().spend('resetsOfAccount', email)
  await Promise.all([makeLinkFor(email, requestId), sleep(answerAfterMs)])
  return { sent: true }
}

async function makeLinkFor(email: string, requestId: string): Promise<void> {
  const person = await Person.findOne({ where: { email, state: 'active' }, raw: true })
  if (!person) return
  await inTransaction({ person: null, requestId }, async (tx) => {
    const linkId = await makeLink(person.id, 'password reset', tx)
    tx.record({ type: 'person.reset-asked', id: person.id, siteId: person.siteId, customerId: person.customerId, data: { linkId } })
  })
}
