import { execFile } from 'node:child_process'
import { createHash } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import { promisify } from 'node:util'
import type { Page } from 'playwright-core'

const run = promisify(execFile)

export type ReadReport = { number: string; fileName: string; text: string; sha256: string }

/** Downloads the report from the job's page and reads it as a person would, line by line. */
export async function downloadReport(page: Page): Promise<ReadReport> {
  const link = page.getByRole('region', { name: 'Reports' }).getByRole('link', { name: /^R-/ })
  await link.waitFor()
  const number = await link.innerText()
  const [download] = await Promise.all([page.waitForEvent('download'), link.click()])
  const path = await download.path()
  const { stdout } = await run('pdftotext', ['-layout', path, '-'])
  return { number, fileName: download.suggestedFilename(), text: stdout, sha256: createHash('sha256').update(await readFile(path)).digest('hex') }
}
