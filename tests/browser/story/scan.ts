import type { Page } from 'playwright-core'

/** A label under the scanner. It is a keyboard that types faster than the line between this test and the browser could. */
export async function scan(page: Page, code: string): Promise<void> {
  await page.evaluate((keys) => {
    for (const key of keys) (document.activeElement ?? document.body).dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true }))
  }, [...code, 'Enter'])
}

/** To a page by the strip. */
export async function goTo(page: Page, name: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name }).click()
}
