import { readFileSync } from 'node:fs'
import type { Page } from 'playwright-core'
import { expect } from 'vitest'
import type { Hands } from './work-through.ts'

/** Readings typed by keyboard, one mistyped and struck out, and the page reloaded in the middle. */
export const rockwellWithMistake: Hands = async (page) => {
  await typeReadings(page, ['31.2', '31.6'])
  await typeReading(page, '13.4')
  await page.keyboard.press('ArrowUp')
  await page.keyboard.press('s')
  const dialog = page.getByRole('dialog')
  await dialog.getByText('typed wrong').click()
  await dialog.getByRole('button', { name: 'Strike out' }).click()
  await page.getByText('struck out: typed wrong').waitFor()

  await typing(page).focus()
  await typeByHand(page, '31.')
  await page.reload()
  await page.getByText('struck out: typed wrong').waitFor()
  for (const kept of ['31.2', '31.6', '13.4']) await row(page, kept).waitFor()
  expect(await typing(page).inputValue()).toBe('31.')
  await typing(page).focus()
  await page.keyboard.press('End')
  await typeByHand(page, '4')
  await page.keyboard.press('Enter')
  await row(page, '31.4').waitFor()
}

/** A set of readings in one go. */
export const rockwell = (readings: readonly string[]): Hands => (page) => typeReadings(page, readings)

/** A round test piece and its record from the frame: sizes, file, columns, sizes after the pull. */
export const tensile = ({ file, diameter, gaugeLength, finalGaugeLength, finalDiameter }: { file: string; diameter: string; gaugeLength: string; finalGaugeLength: string; finalDiameter: string }): Hands => async (page) => {
  for (const place of [1, 2, 3]) {
    await page.getByLabel(`Diameter ${place}`, { exact: true }).fill(diameter)
    await page.keyboard.press('Enter')
  }
  for (const [label, value] of [['L0', gaugeLength], ['Le', gaugeLength]] as const) await typeNamed(page, label, value)
  await drop(page, `tests/standards/records/42CrMoS4/${file}`)
  const record = page.getByRole('region', { name: 'The record' })
  for (const [label, column, unit] of [['Extension', 'extension_mm', 'mm'], ['Force', 'force_N', 'N'], ['Time', 'time_s', 's']] as const) {
    await record.getByLabel(label, { exact: true }).selectOption(column)
    await record.getByLabel(`Unit of the ${label.toLowerCase()}`).selectOption(unit)
  }
  await record.getByRole('button', { name: 'Take this record' }).click()
  await page.getByText(/^Record of [\d,.\s]+ points, kept/).waitFor()
  await typeNamed(page, 'Lu after the pull', finalGaugeLength)
  await typeNamed(page, 'Diameter at the neck 1', finalDiameter)
  await page.getByRole('button', { name: /^Z \d+ %/ }).waitFor()
  await page.getByRole('group', { name: /^Stress against extension.*, Rp0\.2 / }).waitFor()
}

/** Counts field by field; the length of the line is carried from field to field. */
export const grainCounts = (counts: readonly string[], lineMm: string): Hands => async (page) => {
  for (const [at, count] of counts.entries()) {
    await typing(page).fill(count)
    if (at === 0) {
      await page.keyboard.press('Tab')
      await typeByHand(page, lineMm)
    }
    await page.keyboard.press('Enter')
    await page.getByLabel(`Field ${at + 2}, boundary intersections`).waitFor()
  }
}

const typing = (page: Page) => page.locator('tr[data-typing] input').first()
const row = (page: Page, reading: string) => page.locator('tr[data-row]').filter({ has: page.getByRole('cell', { name: reading, exact: true }) })

/** As fast as quick hands; keys that follow within 45 ms are taken for a scanner's. */
async function typeByHand(page: Page, text: string): Promise<void> {
  await page.keyboard.type(text, { delay: 60 })
  await page.waitForTimeout(60)
}

/** One reading into the row that is being typed, kept by Enter. */
export async function typeReading(page: Page, reading: string): Promise<void> {
  await typing(page).waitFor()
  await typeByHand(page, reading)
  await page.keyboard.press('Enter')
  await row(page, reading).waitFor()
}

async function typeReadings(page: Page, readings: readonly string[]): Promise<void> {
  for (const reading of readings) await typeReading(page, reading)
}

async function typeNamed(page: Page, label: string, value: string): Promise<void> {
  await page.getByLabel(label, { exact: true }).fill(value)
  await page.keyboard.press('Enter')
}

/** Drops a file of the project where the sheet asks for one. */
async function drop(page: Page, path: string): Promise<void> {
  const text = readFileSync(path, 'utf8')
  const transfer = await page.evaluateHandle(({ text: content, name }) => {
    const data = new DataTransfer()
    data.items.add(new File([content], name, { type: 'text/csv' }))
    return data
  }, { text, name: path.slice(path.lastIndexOf('/') + 1) })
  await page.getByText("Drop the frame's record here").dispatchEvent('drop', { dataTransfer: transfer })
}
