import type { Page } from 'playwright-core'
import { goTo, scan } from './scan.ts'

/** Takes a parcel of two in by their labels: the first as it should be, by Enter alone, the second with what was seen on it. */
export async function receive(page: Page, [first, second]: readonly [string, string]): Promise<void> {
  await goTo(page, 'Receive')
  await page.getByRole('heading', { level: 1, name: 'Receive samples' }).waitFor()
  await scan(page, first)
  await page.getByRole('region', { name: `Receive ${first}` }).waitFor()
  await page.keyboard.press('Enter')
  await page.getByText(`${first} received.`).waitFor()

  // the next of the job is in hand already; scanning its label must not type the code into the form
  await page.getByRole('region', { name: `Receive ${second}` }).waitFor()
  await scan(page, second)
  const form = page.getByRole('region', { name: `Receive ${second}` })
  await form.getByRole('button', { name: 'surface rust' }).click()
  await form.getByRole('button', { name: /^Receive/ }).click()
  await page.getByText(`${second} received.`).waitFor()
  await page.getByText('2 of 2 received').waitFor()
}
