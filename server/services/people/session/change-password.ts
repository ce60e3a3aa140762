import { Problem } from '../../../../shared/problems.ts'
import type { Caller } from '../../../caller.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { limits } from '../../../integrations/limits/limits.ts'
import { Company } from '../../../models/people/company.ts'
import { Person } from '../../../models/people/person.ts'
import { checkPassword } from '../password/check-password.ts'
import { hashPassword, isPassword } from '../password/hash-password.ts'
import { endSessions } from './end-sessions.ts'

/** Changes one's own password and ends every session of the person; gives the epoch that a new session must name. */
export async function changePassword({ current, next }: { current: string; next: string }, address: string, caller: Caller): Promise<{ id: string; epoch: number }> {
  const attempt = await limits().tryPassword(caller.person.email, address)
  const person = await Person.findByPk(caller.person.id, { raw: true, rejectOnEmpty: true })
  if (!(await isPassword(person.passwordHash, current))) throw new Problem('not-acceptable', 'the present password is not right', { current: 'is not your present password' })
  await attempt.succeeded()
  if (next === current) throw new Problem('not-acceptable', 'the new password is the old one', { next: 'has to differ from the present one' })
  const company = await Company.findOne({ raw: true })
  checkPassword(next, { name: person.name, email: person.email, company: company?.name ?? '' }, 'next')
  const passwordHash = await hashPassword(next)
  return inTransaction(caller, async (tx) => {
    const epoch = person.sessionEpoch + 1
    const [changed] = await Person.update({ passwordHash, sessionEpoch: epoch }, { where: { id: person.id, state: 'active', sessionEpoch: person.sessionEpoch }, transaction: tx })
    if (changed === 0) throw new Problem('already-changed', 'your account changed at the same moment; sign in again')
    await endSessions(person.id, tx)
    tx.record({ type: 'person.password-changed', id: person.id, siteId: person.siteId, customerId: person.customerId })
    return { id: person.id, epoch }
  })
}
