import { outside } from '../../integrations/outside.ts'
import { Company } from '../../models/people/company.ts'
import { Link } from '../../models/people/link.ts'
import { Person } from '../../models/people/person.ts'
import { linkToken } from '../people/link-token.ts'
import { sendOnce } from './send-once.ts'

/** Mails a person the link of their invitation or password reset, as long as it can still be used. */
export async function mailLink(linkId: string): Promise<void> {
  const link = await Link.findByPk(linkId, { raw: true, rejectOnEmpty: true })
  const person = await Person.findByPk(link.personId, { raw: true, rejectOnEmpty: true })
  if (link.usedAt || link.expiresAt <= new Date() || person.state === 'disabled') return
  const company = await Company.findOne({ raw: true })
  const house = company?.name ?? 'Crosshead'
  const address = `${outside().settings.BASE_URL}/links/${linkToken(linkId)}`
  const isInvitation = link.purpose === 'invitation'
  await sendOnce({
    key: `link:${linkId}`, to: person.email, subject: isInvitation ? `Your account with ${house}` : 'Choose a new password',
    text: [
      `Dear ${person.name},`, '',
      isInvitation ? `${house} has made an account for you. Choose your password here, within three days:` : 'somebody, most likely you, asked for a new password. Choose it here, within an hour:',
      address, '',
      isInvitation ? 'If you expected no account, leave this mail alone.' : 'If it was not you, leave this mail alone: your password stays as it is.', '',
      house, '',
    ].join('\n'),
  })
}
