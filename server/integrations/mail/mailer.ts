import type { Readable } from 'node:stream'

export type MailAttachment = {
  filename: string
  contentType: string
  content: Buffer | Readable
}

export type Mail = {
  /** One address; a list in it is refused. */
  to: string
  subject: string
  text: string
  html?: string
  attachments?: MailAttachment[]
  /** Chosen by the caller and the same on every attempt, such as `<report-0198….delivered@lab.example>`, so that a repeat can be recognised. */
  messageId: string
}

/** Sends mail. A failure is a `MailError` that says whether another attempt can help. */
export type Mailer = {
  send: (mail: Mail) => Promise<void>
  close: () => void
}
