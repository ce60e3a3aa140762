import { SMTPServer } from 'smtp-server'
import type { MailFaults } from './mail-faults.ts'
import type { MailStore } from './mail-store.ts'

const maxBytes = 30 * 1024 * 1024

export type Smtp = {
  port: number
  stop: () => Promise<void>
}

/** Receives mail for anybody; refuses or delays when a fault is planned. */
export function createSmtp(port: number, store: MailStore, faults: MailFaults): Promise<Smtp> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anybody' }),
    allowInsecureAuth: true,
    size: maxBytes,
    disableReverseLookup: true,
    closeTimeout: 200,
    logger: false,
    onData(stream, session, done) {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('error', done)
      stream.on('end', () => {
        if (stream.sizeExceeded) return done(reply(552, `mail above ${maxBytes} bytes`))
        const to = session.envelope.rcptTo.map((recipient) => recipient.address)
        receive(Buffer.concat(chunks), to).then(() => done(null), done)
      })
    },
  })
  const receive = async (raw: Buffer, to: string[]): Promise<void> => {
    const fault = faults.take()
    if (fault?.how === 'refuse') throw reply(550, 'refused as planned')
    if (fault?.how === 'try-later') throw reply(451, 'not now, as planned')
    if (fault?.how === 'delay') await new Promise((resolve) => setTimeout(resolve, fault.delayMs))
    await store.keep(raw, to)
    // Taken, but the sender never learns it: its next attempt is a repeat.
    if (fault?.how === 'lose-answer') throw reply(421, 'connection lost, as planned')
  }

  return new Promise((resolve, reject) => {
    server.on('error', (error: Error) => reject(error))
    const listener = server.listen(port, '127.0.0.1', () => {
      const address = listener.address()
      if (address === null || typeof address === 'string') return reject(new Error('the mail server has no port'))
      resolve({ port: address.port, stop: () => new Promise((stopped) => server.close(() => stopped())) })
    })
  })
}

function reply(responseCode: number, message: string): Error {
  return Object.assign(new Error(message), { responseCode })
}
