import type { Page } from 'playwright-core'
import { goTo, scan } from './scan.ts'

export type Hands = (page: Page, number: string) => Promise<void>

/** A sample's way to its next bench: its label scanned, the step opened from its page. When the plan moves it just then, once more. */
export async function openStep(page: Page, number: string, step: string): Promise<void> {
  for (let attempt = 0; attempt < 3; attempt++) {
    await walkTo(page, number, step)
    const sheet = page.getByRole('region', { name: 'Sheet' })
    const moved = sheet.getByText('This step is no longer in the queue')
    await moved.or(sheet.getByRole('heading', { level: 1, name: number })).or(sheet.getByText(number)).first().waitFor()
    if (!(await moved.isVisible())) return
  }
}

async function walkTo(page: Page, number: string, step: string): Promise<void> {
  await goTo(page, 'Bench')
  await page.getByRole('heading', { level: 1, name: 'Choose your bench' }).waitFor()
  await scan(page, number)
  await page.getByRole('heading', { level: 1, name: `Sample ${number}` }).waitFor()
  await page.getByRole('link', { name: `${step.charAt(0).toUpperCase()}${step.slice(1)} at the bench` }).click()
  await page.waitForURL(/\/bench\/[^/]+\?step=/)
}

/** Preparation: begun and done by one key each. */
export async function prepare(page: Page, number: string, step: string): Promise<void> {
  await openStep(page, number, step)
  await page.getByRole('button', { name: 'Start B', disabled: false }).waitFor()
  await page.keyboard.press('b')
  await page.getByRole('button', { name: 'Done D', disabled: false }).waitFor()
  await page.keyboard.press('d')
  await page.getByText(`${number}: ${step} done.`).waitFor()
}

/** A run: begun by a key, measured by the given hands, recorded by a key. */
export async function measure(page: Page, number: string, step: string, hands: Hands): Promise<void> {
  await openStep(page, number, step)
  await page.getByRole('button', { name: 'Begin run B', disabled: false }).waitFor()
  await page.keyboard.press('b')
  await hands(page, number)
  await page.getByRole('button', { name: /^Record run/ }).click({ trial: true }) // comes back when it could be pressed
  await page.keyboard.press('Control+Enter')
  await page.getByText(new RegExp(`^${number}, .*: recorded, waits for review\\.$`)).waitFor()
}
