import { Op, type Transaction } from 'sequelize'
import { Problem } from '../../../../shared/problems.ts'
import { Link } from '../../../models/people/link.ts'
import { Person } from '../../../models/people/person.ts'
import { hashToken } from '../link-token.ts'

/** A link that can still be used and whose it is; `not-found` when it is unknown, used up, too old, or its person is disabled. */
export async function openLink(token: string, transaction?: Transaction): Promise<{ link: Link; person: Person }> {
  const link = await Link.findOne({ where: { tokenHash: hashToken(token), usedAt: null, expiresAt: { [Op.gt]: new Date() } }, raw: true, transaction })
  const person = link && (await Person.findOne({ where: { id: link.personId, state: link.purpose === 'invitation' ? 'invited' : 'active' }, raw: true, transaction }))
  if (!link || !person) throw new Problem('not-found', 'this link has been used or is too old; ask for a new one')
  return { link, person }
}
