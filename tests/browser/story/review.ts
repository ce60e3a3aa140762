import type { Page } from 'playwright-core'
import { demoPassword } from '../../../server/database/seeds/demo-people.ts'
import { goTo } from './scan.ts'

/** Accepts a recorded run after a look at it. */
export async function accept(page: Page, number: string, label: string): Promise<void> {
  await openRun(page, number, label)
  await page.getByRole('button', { name: /^Accept run/, disabled: false }).waitFor()
  await page.keyboard.press('Control+Enter')
  await page.getByText(`${number} ${label}: run accepted.`).waitFor()
}

/** Sends a recorded run back to the bench with a reason. */
export async function sendBack(page: Page, number: string, label: string, reason: string): Promise<void> {
  await openRun(page, number, label)
  await page.getByRole('button', { name: 'Send back…', disabled: false }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('What has to be done again, and why').fill(reason)
  await dialog.getByRole('button', { name: 'Send back' }).click()
  await page.getByText(`${number} ${label}: run sent back.`).waitFor()
}

/** Signs for the report of a job, with the password. */
export async function issueReport(page: Page, jobNumber: string): Promise<void> {
  await goTo(page, 'Jobs')
  await page.getByRole('link', { name: jobNumber }).first().click()
  await page.getByRole('button', { name: 'Issue report', disabled: false }).click()
  const dialog = page.getByRole('dialog')
  await dialog.getByLabel('Your password').fill(demoPassword)
  await dialog.getByRole('button', { name: 'Sign and issue' }).click()
  await page.getByText('The report is being made').waitFor()
}

async function openRun(page: Page, number: string, label: string): Promise<void> {
  await goTo(page, 'Review')
  await page.getByRole('navigation', { name: 'Queue' }).getByRole('link').filter({ hasText: number }).filter({ hasText: label }).click()
  await page.getByRole('heading', { level: 1, name: `${number} ${label}` }).waitFor()
}
