import { Op } from 'sequelize'
import { Problem } from '../../../../shared/problems.ts'
import { inTransaction } from '../../../database/transaction.ts'
import { Company } from '../../../models/people/company.ts'
import { Link } from '../../../models/people/link.ts'
import { Person } from '../../../models/people/person.ts'
import { checkPassword } from '../password/check-password.ts'
import { hashPassword } from '../password/hash-password.ts'
import { endSessions } from '../session/end-sessions.ts'
import { openLink } from './open-link.ts'

/** Sets the password that a link asks for, once, ends every session of the person and all their other links; gives who may sign in now. */
export async function useLink(token: string, password: string, requestId: string): Promise<{ id: string; epoch: number }> {
  const { link, person } = await openLink(token)
  const company = await Company.findOne({ raw: true })
  checkPassword(password, { name: person.name, email: person.email, company: company?.name ?? '' }, 'password')
  const passwordHash = await hashPassword(password)
  return inTransaction({ person, requestId }, async (tx) => {
    const now = new Date()
    const used = await Link.update({ usedAt: now }, { where: { id: link.id, usedAt: null, expiresAt: { [Op.gt]: now } }, transaction: tx })
    const epoch = person.sessionEpoch + 1
    const changed = await Person.update(
      { passwordHash, state: 'active', sessionEpoch: epoch, lastSignInAt: now, version: person.version + 1 },
      { where: { id: person.id, state: person.state, sessionEpoch: person.sessionEpoch, version: person.version }, transaction: tx },
    )
    if (used[0] === 0 || changed[0] === 0) throw new Problem('not-found', 'this link has been used or is too old; ask for a new one')
    await Link.update({ usedAt: now }, { where: { personId: person.id, usedAt: null }, transaction: tx })
    await endSessions(person.id, tx)
    const about = { id: person.id, siteId: person.siteId, customerId: person.customerId }
    tx.record({ type: link.purpose === 'invitation' ? 'person.joined' : 'person.password-changed', ...about })
    tx.record({ type: 'person.signed-in', ...about })
    return { id: person.id, epoch }
  })
}
