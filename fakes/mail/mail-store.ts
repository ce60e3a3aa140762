import { createHash, randomUUID } from 'node:crypto'
import { mkdir, mkdtemp, readdir, readFile, rename, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { simpleParser, type ParsedMail } from 'mailparser'

export type ReceivedAttachment = { name: string; contentType: string; size: number; sha256: string; content: Buffer }

export type ReceivedMail = {
  id: string
  receivedAt: Date
  /** From the envelope: who it was really sent to. */
  to: string[]
  from: string
  subject: string
  text: string
  html: string | null
  messageId: string
  attachments: ReceivedAttachment[]
}

export type MailStore = {
  keep: (raw: Buffer, to: string[]) => Promise<ReceivedMail>
  /** Oldest first. */
  all: () => readonly ReceivedMail[]
}

/** Messages as files, one each, as they came over the wire; a folder of the system's for temporary files when none is given. */
export async function openMailStore(folder: string | undefined): Promise<MailStore> {
  const place = folder ?? (await mkdtemp(join(tmpdir(), 'mail-stand-in-')))
  await mkdir(place, { recursive: true })
  const kept: ReceivedMail[] = []
  for (const name of (await readdir(place)).filter((entry) => entry.endsWith('.eml')).sort()) kept.push(await readMail(place, name))

  return {
    all: () => kept,
    async keep(raw, to) {
      const name = `${new Date().toISOString().replaceAll(':', '')}_${randomUUID()}.eml`
      const envelope = Buffer.from(`X-Envelope-To: ${JSON.stringify(to)}\r\n`)
      await writeFile(join(place, `${name}.new`), Buffer.concat([envelope, raw]), { mode: 0o600 })
      await rename(join(place, `${name}.new`), join(place, name))
      const mail = await readMail(place, name)
      kept.push(mail)
      return mail
    },
  }
}

async function readMail(folder: string, name: string): Promise<ReceivedMail> {
  const mail = await simpleParser(await readFile(join(folder, name)))
  const [time, id] = name.replace('.eml', '').split('_')
  return {
    id: id ?? name,
    receivedAt: new Date((time ?? '').replace(/T(\d\d)(\d\d)/, 'T$1:$2:')),
    to: recipients(mail),
    from: mail.from?.text ?? '',
    subject: mail.subject ?? '',
    text: mail.text ?? '',
    html: mail.html ? mail.html : null,
    messageId: mail.messageId ?? '',
    attachments: mail.attachments.map((attachment) => ({
      name: attachment.filename ?? 'attachment',
      contentType: attachment.contentType,
      size: attachment.size,
      sha256: createHash('sha256').update(attachment.content).digest('hex'),
      content: attachment.content,
    })),
  }
}

function recipients(mail: ParsedMail): string[] {
  const envelope = mail.headers.get('x-envelope-to')
  const parsed: unknown = typeof envelope === 'string' ? JSON.parse(envelope) : []
  return Array.isArray(parsed) ? parsed.map(String) : []
}
