import type { Page } from 'playwright-core'
import { goTo, scan } from './scan.ts'

export type Hands = (page: Page, number: string) => Promise<void>
const mostWalks = 5

/** Preparation: begun and done by one key each. */
export async function prepare(page: Page, number: string, step: string): Promise<void> {
  await begin(page, number, step, { by: 'Start B', then: 'Done D' })
  await page.getByRole('button', { name: 'Done D', disabled: false }).waitFor()
  await page.keyboard.press('d')
  await page.getByText(`${number}: ${step} done.`).waitFor()
}

/** A run: begun by a key, measured by the given hands, recorded by a key. */
export async function measure(page: Page, number: string, step: string, hands: Hands): Promise<void> {
  await beginRun(page, number, step)
  await hands(page, number)
  await page.getByRole('button', { name: /^Record run/ }).click({ trial: true }) // comes back when it could be pressed
  await page.keyboard.press('Control+Enter')
  await page.getByText(new RegExp(`^${number}, .*: recorded, waits for review\\.$`)).waitFor()
}

/** Opens a run at the bench where the sample is due. */
export const beginRun = (page: Page, number: string, step: string) => begin(page, number, step, { by: 'Begin run B', then: 'Stop run' })

/** Goes to the bench and begins there. Where the plan has just moved the step to another bench, goes to that one, as anyone would. */
async function begin(page: Page, number: string, step: string, { by, then }: { by: string; then: string }): Promise<void> {
  const sheet = page.getByRole('region', { name: 'Sheet' })
  const moved = sheet.getByText('This step is no longer in the queue')
  const begun = sheet.getByRole('button', { name: then })
  for (let walks = 0; walks < mostWalks; walks++) {
    await walkTo(page, number, step)
    await moved.or(sheet.getByRole('button', { name: by, disabled: false })).first().waitFor()
    if (await moved.isVisible()) continue
    await page.keyboard.press('b')
    await moved.or(begun).first().waitFor()
    if (await begun.isVisible()) return
  }
  throw new Error(`${number}: ${step} was moved from bench to bench ${mostWalks} times`)
}

/** A sample's way to its next bench: its label scanned, the step opened from its page. */
async function walkTo(page: Page, number: string, step: string): Promise<void> {
  await goTo(page, 'Bench')
  await page.getByRole('heading', { level: 1, name: 'Choose your bench' }).waitFor()
  await scan(page, number)
  await page.getByRole('heading', { level: 1, name: `Sample ${number}` }).waitFor()
  await page.getByRole('link', { name: `${step.charAt(0).toUpperCase()}${step.slice(1)} at the bench` }).click()
  await page.waitForURL(/\/bench\/[^/]+\?step=/)
}
