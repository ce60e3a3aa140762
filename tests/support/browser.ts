import { chromium, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core'
import { afterAll, afterEach, expect } from 'vitest'
import { demoPassword } from '../../server/database/seeds/demo-people.ts'

const program = process.env.CHROMIUM ?? '/usr/bin/chromium'
const flags = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync']

export type Screen = { width: number; height: number; theme?: 'light' | 'dark' }
export const desk: Screen = { width: 1440, height: 900 }

export type People = {
  /** A browser of this person's own at the given address, signed in by the form. */
  signIn(email: string, screen?: Screen): Promise<Page>
  /** Another page in the same person's browser. */
  another(page: Page): Promise<Page>
  /** A browser that knows nobody, or what another one knew. */
  visit(screen?: Screen, known?: BrowserContextOptions['storageState']): Promise<Page>
  /** Lets the console say what this test brings about on purpose, such as a cut line. */
  expectWords(words: RegExp): void
}

/**
 * Chromium for one test file. Whatever its pages write to the console as an error, throw, or fail to load fails the test in which it
 * happens; a test that fails leaves a picture of every open page in .build/failures.
 */
export async function openBrowser(address: string): Promise<People> {
  const browser: Browser = await chromium.launch({ executablePath: program, args: flags })
  const contexts = new Set<BrowserContext>()
  const faults: string[] = []
  const expected: RegExp[] = []

  afterEach(async ({ task }) => {
    if (task.result?.state === 'fail') await picture(contexts, `${task.suite?.name ?? ''} ${task.name}`)
    const unexpected = faults.splice(0).filter((words) => !expected.some((pattern) => pattern.test(words)))
    expected.length = 0
    expect(unexpected, 'what the pages complained about').toEqual([])
  })
  afterAll(() => browser.close())

  async function open({ width, height, theme = 'light' }: Screen, options: BrowserContextOptions = {}): Promise<Page> {
    const context = await browser.newContext({ viewport: { width, height }, colorScheme: theme, baseURL: address, locale: 'en-GB', timezoneId: 'Europe/London', acceptDownloads: true, ...options })
    context.setDefaultTimeout(60_000)
    contexts.add(context)
    context.on('close', () => contexts.delete(context))
    context.on('console', (message) => {
      if (message.type() === 'error' || message.type() === 'warning') faults.push(`${message.text()} (${message.location().url})`)
    })
    context.on('weberror', (error) => faults.push(`${error.error().stack ?? error.error().message}`))
    return context.newPage()
  }
  return {
    async signIn(email, screen = desk) {
      const page = await open(screen)
      await page.goto('/')
      await page.getByLabel('Email').fill(email)
      await page.getByLabel('Password', { exact: true }).fill(demoPassword)
      await page.getByRole('button', { name: 'Sign in' }).click()
      await page.waitForURL((url) => url.pathname !== '/' && url.pathname !== '/sign-in')
      return page
    },
    another: (page) => page.context().newPage(),
    visit: (screen = desk, known) => open(screen, { storageState: known }),
    expectWords: (words) => { expected.push(words) },
  }
}

async function picture(contexts: ReadonlySet<BrowserContext>, name: string): Promise<void> {
  const pages = [...contexts].flatMap((context) => context.pages())
  for (const [at, page] of pages.entries()) {
    const path = `.build/failures/${name.replaceAll(/[^a-z0-9]+/gi, '-').slice(0, 100)}-${at + 1}.png`
    await page.screenshot({ path, fullPage: true, timeout: 5000 }).catch(() => undefined)
  }
}
