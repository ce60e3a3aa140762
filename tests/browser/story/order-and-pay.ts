import type { Page } from 'playwright-core'
import { expect } from 'vitest'

export type Ordered = { id: string; number: string; samples: readonly [string, string] }

/** Orders three tests for two samples: rows and limits typed, price and day read while typing, paid on the payment page. */
export async function orderAndPay(page: Page): Promise<Ordered> {
  await page.getByRole('button', { name: 'New job' }).click()
  await page.waitForURL(/\/jobs\/[^/]+\/order$/)
  const number = await page.getByRole('heading', { level: 1 }).locator('.mono').innerText()
  await page.getByLabel('Purchase order').fill('BF-90001')
  await typeRows(page)
  for (const title of ['Rockwell hardness', 'Tensile', 'Grain size by intercept']) await addTest(page, title)
  await expect.poll(() => page.getByRole('checkbox', { name: /, row [12]$/ }).evaluateAll((boxes) => boxes.map((box) => (box as HTMLInputElement).checked))).toEqual(Array.from({ length: 6 }, () => true))

  await setLimits(page, 'Rockwell HRC', async () => {
    await page.getByLabel('Mean hardness, lowest').fill('29')
    await page.getByLabel('Mean hardness, highest').fill('34')
  })
  await setLimits(page, 'Tensile', async () => {
    await page.getByRole('button', { name: 'Limits on other results' }).click()
    await page.getByLabel('proof strength, lowest').fill('900')
    await page.getByLabel('tensile strength, lowest').fill('1100')
  })
  const aside = page.getByRole('complementary', { name: 'Price and promise' })
  await aside.getByText('earliest finish', { exact: false }).waitFor()
  // 2 × (18 + 84 + 62) and a fifth of tax
  await aside.getByText('393.60').waitFor()
  await page.getByText(/^kept \d\d:\d\d, on this device and here$/).waitFor()

  await aside.getByRole('button', { name: 'Place job' }).click()
  await page.getByRole('heading', { name: 'Pay by card' }).waitFor()
  await page.getByRole('button', { name: /^Pay / }).click()
  await page.waitForURL(/\/jobs\/[^/]+\?payment=back$/)
  await page.getByText('Payment received.').waitFor()
  for (const place of ['01', '02']) await page.getByRole('link', { name: `Sample ${number}-${place}` }).waitFor()
  return { id: new URL(page.url()).pathname.split('/')[2]!, number, samples: [`${number}-01`, `${number}-02`] }
}

/** As at a table: cell by cell with Tab, the next row from the empty one below. What is left empty there comes from the row above. */
async function typeRows(page: Page): Promise<void> {
  const rows = [['7K4501', 'B-301', '42CrMo4 +QT', 'bar', '60'], ['7K4502', 'B-302']]
  for (const cells of rows) {
    await page.getByRole('textbox', { name: 'heat, new row' }).click()
    for (const [at, cell] of cells.entries()) {
      if (at > 0) await page.keyboard.press('Tab')
      await page.keyboard.type(cell)
    }
  }
}

async function addTest(page: Page, title: string): Promise<void> {
  await page.getByRole('button', { name: 'Add a test' }).click()
  await page.getByRole('menuitem', { name: title }).click()
}

async function setLimits(page: Page, label: string, fill: () => Promise<void>): Promise<void> {
  await page.getByRole('columnheader', { name: label }).getByRole('button').click()
  await fill()
  await page.keyboard.press('Escape')
}
