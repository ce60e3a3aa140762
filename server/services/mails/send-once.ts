import { QueryTypes } from 'sequelize'
import { v7 } from 'uuid'
import { database } from '../../database/connection.ts'
import type { MailAttachment } from '../../integrations/mail/mailer.ts'
import { outside } from '../../integrations/outside.ts'
import { Mail } from '../../models/reports/mail.ts'

type ToSend = { key: string; to: string; subject: string; text: string; attachments?: MailAttachment[] }

/** A claim that is older belongs to a worker that died: sending takes seconds. */
const claimSeconds = 120

/**
 * Sends a mail that has this key, unless it was sent. The claim is a row: of two workers one sends, the other throws and is
 * tried again later. SMTP cannot say whether a server took a mail before a worker died, so in that one case it is sent again, under the
 * same Message-ID, by which mail programs know it as the same.
 */
export async function sendOnce({ key, to, subject, text, attachments }: ToSend): Promise<void> {
  const claimedAt = await claim(key, to, subject)
  if (claimedAt === null) return
  const { mail, settings } = outside()
  const mine = { key, claimedAt }
  try {
    await mail.send({ to, subject, text, attachments, messageId: `<${key.replace(/[^A-Za-z0-9.-]/g, '.')}@${new URL(settings.BASE_URL).hostname}>` })
  } catch (error) {
    // not sent: whoever tries next need not wait for the claim to grow old
    await Mail.update({ claimedAt: new Date(0) }, { where: { ...mine, state: 'sending' } })
    throw error
  }
  await Mail.update({ state: 'sent', sentAt: new Date() }, { where: { key } })
}

/** Our claim's time; null when the mail was sent already. Throws while another worker sends it. */
async function claim(key: string, to: string, subject: string): Promise<Date | null> {
  const now = new Date()
  const stale = new Date(now.getTime() - claimSeconds * 1000)
  const [claimed] = await database.query<{ id: string }>(
    `insert into mails (id, key, recipient, subject, state, claimed_at, created_at) values ($1, $2, $3, $4, 'sending', $5, $5)
     on conflict (key) do update set claimed_at = $5, recipient = $3, subject = $4 where mails.state = 'sending' and mails.claimed_at < $6 returning id`,
    { bind: [v7(), key, to, subject, now, stale], type: QueryTypes.SELECT },
  )
  if (claimed) return now
  const known = await Mail.findOne({ where: { key }, raw: true })
  if (known?.state === 'sent') return null
  throw new Error(`mail ${key} is being sent by another worker`)
}
