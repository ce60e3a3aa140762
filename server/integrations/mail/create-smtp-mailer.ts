import { createTransport } from 'nodemailer'
import * as z from 'zod'
import { MailError } from './mail-error.ts'
import type { Mail, Mailer } from './mailer.ts'

export type SmtpMailerOptions = {
  /** `smtp://` or `smtps://`, with user and password in it where needed. */
  url: string
  /** Sender as the recipient sees it: `Name <address>` or an address. */
  from: string
  timeoutMs?: number
}

const Address = z.email()
const MessageId = z.string().regex(/^<[^\s<>@]+@[^\s<>@]+>$/)
// SMTP headers are one line each; whoever can put a line break into one writes headers of their own.
const OneLine = z.string().min(1).max(500).regex(/^[^\r\n]*$/)

/** The mailer by SMTP. */
export function createSmtpMailer({ url, from, timeoutMs = 15_000 }: SmtpMailerOptions): Mailer {
  const transport = createTransport({
    url,
    pool: true,
    maxConnections: 2,
    connectionTimeout: timeoutMs,
    greetingTimeout: timeoutMs,
    socketTimeout: timeoutMs,
    dnsTimeout: timeoutMs,
    disableFileAccess: true,
    disableUrlAccess: true,
  })

  return {
    async send(mail) {
      checkHeaders(mail)
      try {
        await transport.sendMail({
          from,
          // An object, not a string: a string could hold a list.
          to: { name: '', address: mail.to },
          subject: mail.subject,
          text: mail.text,
          ...(mail.html !== undefined && { html: mail.html }),
          attachments: mail.attachments ?? [],
          messageId: mail.messageId,
        })
      } catch (error) {
        throw new MailError(isPermanent(error) ? 'refused' : 'unavailable', `mail to ${mail.to}: ${messageOf(error)}`, { cause: error })
      }
    },
    close: () => transport.close(),
  }
}

function checkHeaders(mail: Mail): void {
  if (!Address.safeParse(mail.to).success) throw new MailError('refused', `to: ${JSON.stringify(mail.to)} is not one mail address`)
  if (!OneLine.safeParse(mail.subject).success) throw new MailError('refused', 'subject: must be one line of 1 to 500 characters')
  if (!MessageId.safeParse(mail.messageId).success) throw new MailError('refused', `messageId: ${JSON.stringify(mail.messageId)} must look like <name@host>`)
}

const SmtpReply = z.object({ responseCode: z.int() })

function isPermanent(error: unknown): boolean {
  const reply = SmtpReply.safeParse(error)
  return reply.success && reply.data.responseCode >= 500
}

function messageOf(error: unknown): string {
  return error instanceof Error ? error.message : String(error)
}
