import { Problem } from '../../../../shared/problems.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { limits } from '../../../integrations/limits/limits.ts'
import { Person } from '../../../models/people/person.ts'
import { hashPassword, isOutdated, isPassword } from '../password/hash-password.ts'

/** Stands in the ledger where somebody tried an address that nobody has. */
const nobody = '00000000-0000-0000-0000-000000000000'

/**
 * Checks an e-mail address and password and notes the sign-in, or the refusal. The answer and its time are the same for an
 * unknown address, a wrong password and a person who may not sign in.
 */
export async function signIn({ email, password, address, requestId }: { email: string; password: string; address: string; requestId: string }): Promise<{ id: string; epoch: number }> {
  const attempt = await limits().tryPassword(email, address)
  const person = await Person.findOne({ where: { email }, raw: true })
  const isRight = await isPassword(person?.passwordHash ?? null, password)
  if (!person || !isRight || person.state !== 'active') {
    await inTransaction({ person: null, requestId }, (tx) => {
      tx.record({ type: 'person.sign-in-refused', id: person?.id ?? nobody, siteId: person?.siteId, customerId: person?.customerId })
      return Promise.resolve()
    })
    throw new Problem('wrong-sign-in', 'the e-mail address or the password is not right')
  }
  await attempt.succeeded()
  const renewed = isOutdated(person.passwordHash ?? '') ? { passwordHash: await hashPassword(password) } : {}
  await inTransaction({ person, requestId }, async (tx) => {
    // Only if nothing happened to the account meanwhile: the hash of a password that was just changed must not come back.
    const [changed] = await Person.update({ lastSignInAt: new Date(), ...renewed }, { where: { id: person.id, state: 'active', sessionEpoch: person.sessionEpoch }, transaction: tx })
    if (changed === 0) throw new Problem('wrong-sign-in', 'the e-mail address or the password is not right')
    tx.record({ type: 'person.signed-in', id: person.id, siteId: person.siteId, customerId: person.customerId })
  })
  return { id: person.id, epoch: person.sessionEpoch }
}
