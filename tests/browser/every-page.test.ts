import AxeBuilder from '@axe-core/playwright'
import type { Page } from 'playwright-core'
import type { RouteObject } from 'react-router-dom'
import { afterAll, describe, expect, it } from 'vitest'
import { routes } from '../../src/routes.tsx'
import { openBrowser } from '../support/browser.ts'
import { startProduct } from '../support/product.ts'
import { accounts, everyPage, type Who } from './pages/list.ts'

const standards = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']
/** Clients and the public come with any phone; a bench has at least a tablet, a manager's desk more. */
const narrowest: Record<Who, number> = { anyone: 360, client: 360, technician: 768, manager: 768 }
const mostTabs = 250

const product = await startProduct()
const browser = await openBrowser(product.address)
const pages = await everyPage(product)

const opened = new Map<Who, Page>()
async function pageOf(who: Who): Promise<Page> {
  const page = opened.get(who) ?? (who === 'anyone' ? await browser.visit() : await browser.signIn(accounts[who]))
  opened.set(who, page)
  return page
}
afterAll(async () => { for (const page of opened.values()) await page.context().close() })

it('visits every page there is', () => {
  const all = (list: readonly RouteObject[]): string[] => list.flatMap(({ path, children }) => [...(path ? [path] : []), ...all(children ?? [])])
  // the first page only leads to the page of one's own work
  expect([...new Set(pages.map(({ route }) => route))].sort()).toEqual([...new Set(all(routes))].filter((path) => path !== '/').sort())
})

describe.each(pages)('$route for $who, $address', ({ who, address, ready, deed, says }) => {
  it('has no serious fault for people with other needs, in light and dark, wide and at its narrowest, and never scrolls sideways', { timeout: 300_000 }, async () => {
    if (says) browser.expectWords(says)
    const page = await pageOf(who)
    const found: string[] = []
    for (const width of [1440, narrowest[who]]) {
      await page.setViewportSize({ width, height: 900 })
      await page.goto(address)
      await ready(page).waitFor()
      await page.waitForLoadState('networkidle')
      for (const colorScheme of ['light', 'dark'] as const) {
        await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
        const { violations } = await new AxeBuilder({ page }).withTags(standards).analyze()
        for (const { id, impact, nodes } of violations) {
          if (impact === 'serious' || impact === 'critical') found.push(`${width} ${colorScheme}: ${id}, ${nodes.map(({ target, html }) => `${target.join(' ')} ${html.slice(0, 120)}`).join(' | ')}`)
        }
      }
      const wider = await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)
      if (wider > 0) found.push(`${width}: ${wider} px wider than the window`)
    }
    expect(found).toEqual([])
  })

  it('is used by keyboard: past the strip in one step, to its deed by Tab', { timeout: 300_000 }, async () => {
    if (says) browser.expectWords(says)
    const page = await pageOf(who)
    await page.setViewportSize({ width: 1440, height: 900 })
    await page.goto(address)
    await ready(page).waitFor()
    const skip = page.getByRole('link', { name: 'Skip to the page' })
    if ((await skip.count()) > 0) {
      await skip.focus()
      await page.keyboard.press('Enter')
      expect(await page.evaluate(() => document.activeElement?.id)).toBe('main')
    } else expect(who, 'a page with a strip has a way past it').toBe('anyone')
    if (!deed) return
    const target = deed(page)
    await target.waitFor()
    await page.evaluate(() => { if (document.activeElement instanceof HTMLElement && document.activeElement.id !== 'main') document.activeElement.blur() })
    const isThere = () => target.evaluate((element) => element === document.activeElement)
    let tabs = 0
    for (; tabs < mostTabs && !(await isThere()); tabs++) await page.keyboard.press('Tab')
    expect(tabs, 'presses of Tab from the start of the page to its deed').toBeLessThan(mostTabs)
  })
})
