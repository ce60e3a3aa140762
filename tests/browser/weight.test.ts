import type { Page } from 'playwright-core'
import { expect, it } from 'vitest'
import { openBrowser } from '../support/browser.ts'
import { startProduct } from '../support/product.ts'

/** What the first page may need: 200 kB of script as it goes over the line, compressed. */
const most = 200_000
const product = await startProduct()
const browser = await openBrowser(product.address)

const people = [
  { who: 'a client', email: 'buyer@brackwater.example', first: '/jobs' },
  { who: 'a technician', email: 'bench@tarnwick.example', first: '/bench' },
  { who: 'a manager', email: 'manager@tarnwick.example', first: '/floor' },
]

for (const { who, email, first } of people) {
  it(`gives ${who} the first page with at most 200 kB of compressed script`, async () => {
    const page = await browser.signIn(email)
    const state = await page.context().storageState()
    await page.context().close()
    const cold = await browser.visit(undefined, state)
    const scripts = collectScripts(cold)
    await cold.goto('/')
    await cold.getByRole('heading', { level: 1 }).waitFor()
    await cold.waitForLoadState('networkidle')
    expect(new URL(cold.url()).pathname).toBe(first)
    const kept = [...scripts].map(([name, size]) => `${name} ${size}`)
    const total = [...scripts.values()].reduce((sum, size) => sum + size, 0)
    expect(scripts.size).toBeGreaterThan(1)
    expect(total, kept.join('\n')).toBeLessThanOrEqual(most)
    await cold.context().close()
  })
}

it('fetches the code of a page when the page is opened, and not before', async () => {
  const page = await browser.signIn('buyer@brackwater.example')
  const scripts = collectScripts(page)
  await page.waitForLoadState('networkidle')
  for (const name of ['Samples', 'Reports', 'Invoices']) {
    const before = new Set(scripts.keys())
    await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name }).click()
    await page.getByRole('heading', { level: 1, name }).waitFor()
    expect([...scripts.keys()].filter((script) => !before.has(script)), name).toContainEqual(expect.stringContaining(`${name.toLowerCase()}-page`))
  }
  await page.context().close()
})

/** What the scripts that a page asks for weigh on the line, compressed as the product sends them, by file name. */
function collectScripts(page: Page): Map<string, number> {
  const scripts = new Map<string, number>()
  page.on('response', (response) => {
    if (response.request().resourceType() !== 'script') return
    const name = new URL(response.url()).pathname
    scripts.set(name, Number.NaN)
    void response.request().sizes().then(({ responseBodySize }) => scripts.set(name, responseBodySize))
  })
  return scripts
}
