import type { Page } from 'playwright-core'

/** A label under the scanner. It is a keyboard that types faster than the line between this test and the browser could. */
export async function scan(page: Page, code: string): Promise<void> {
  await page.evaluate((keys) => {
    const began = performance.now()
    for (const [at, key] of keys.entries()) {
      const press = new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true })
      Object.defineProperty(press, 'timeStamp', { value: began + 5 * at }) // however busy the machine is
      const target = document.activeElement ?? document.body
      target.dispatchEvent(press)
    }
  }, [...code, 'Enter'])
}

/** To a page by the strip. */
export async function goTo(page: Page, name: string): Promise<void> {
  await page.getByRole('navigation', { name: 'Pages' }).getByRole('link', { name }).click()
}
