import { createPageApp } from '../page/create-page-app.ts'
import { listenLocal } from '../page/listen-local.ts'
import { createMailFaults, type MailFaults } from './mail-faults.ts'
import { mailRoutes } from './mail-routes.ts'
import { openMailStore, type ReceivedMail } from './mail-store.ts'
import { createSmtp } from './create-smtp.ts'

export type FakeMailOptions = {
  /** Free ones when left out. */
  smtpPort?: number
  pagePort?: number
  /** Where messages are kept; a temporary folder when left out. */
  stateDir?: string
}

export type FakeMail = {
  smtpUrl: string
  pageUrl: string
  smtpPort: number
  pagePort: number
  /** Oldest first. */
  messages: () => readonly ReceivedMail[]
  /** Makes the next messages be refused, delayed or taken without a word. */
  failNext: MailFaults['add']
  clearFaults: MailFaults['clear']
  stop: () => Promise<void>
}

/** Starts the stand-in for a mail server: it takes every message, keeps it, and shows it on a page. */
export async function startFakeMail(options: FakeMailOptions = {}): Promise<FakeMail> {
  const store = await openMailStore(options.stateDir)
  const faults = createMailFaults()
  const smtp = await createSmtp(options.smtpPort ?? 0, store, faults)
  const app = createPageApp()
  app.use(mailRoutes(store, faults))
  const page = await listenLocal(app, options.pagePort ?? 0).catch(async (error: unknown) => {
    await smtp.stop()
    throw error
  })
  return {
    smtpUrl: `smtp://127.0.0.1:${smtp.port}`,
    pageUrl: `http://127.0.0.1:${page.port}`,
    smtpPort: smtp.port,
    pagePort: page.port,
    messages: store.all,
    failNext: faults.add,
    clearFaults: faults.clear,
    async stop() {
      await Promise.all([smtp.stop(), page.close()])
    },
  }
}
