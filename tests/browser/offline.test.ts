import { expect, it } from 'vitest'
import { openBrowser } from '../support/browser.ts'
import { startProduct } from '../support/product.ts'
import { typeReading } from './story/hands.ts'
import { goTo, scan } from './story/scan.ts'
import { beginRun, prepare } from './story/work-through.ts'

const product = await startProduct()
const browser = await openBrowser(product.address)

it('keeps readings typed without a line, through the closing of the tab, and brings each to the server once', { timeout: 600_000 }, async () => {
  const [expected] = await product.query<{ number: string }>(`select s.number from samples s join jobs j on j.id = s.job_id join sites on sites.id = s.site_id where sites.name = 'Tarnwick' and s.state = 'expected' and j.state = 'awaiting samples' order by s.number limit 1`)
  const number = expected!.number
  const page = await browser.signIn('bench@tarnwick.example')
  await goTo(page, 'Receive')
  await page.getByRole('heading', { level: 1, name: 'Receive samples' }).waitFor()
  await scan(page, number)
  await page.getByRole('region', { name: `Receive ${number}` }).waitFor()
  await page.keyboard.press('Enter')
  await page.getByText(`${number} received.`).waitFor()
  await prepare(page, number, 'section')
  await beginRun(page, number, 'measure HRC')
  await typeReading(page, '33.1')
  await page.getByRole('status').filter({ hasText: /^(kept |all kept)/ }).waitFor()
  const address = page.url()

  browser.expectWords(/ERR_INTERNET_DISCONNECTED|ERR_FAILED|ERR_NETWORK/)
  await page.context().setOffline(true)
  for (const reading of ['33.4', '33.2', '33.7']) await typeReading(page, reading)
  await page.getByText('waiting for the server, 3 readings kept on this device').waitFor()
  expect(await readings(number)).toEqual([{ value: 33.1, times: 1 }])

  const again = await browser.another(page)
  await page.close()
  await again.context().setOffline(false)
  await again.goto(address)
  await expect.poll(() => readings(number), { timeout: 60_000 }).toEqual([33.1, 33.2, 33.4, 33.7].map((value) => ({ value, times: 1 })))
  await again.getByRole('status').filter({ hasText: /^(kept |all kept)/ }).waitFor()
  await again.reload()
  await again.getByText('Mean of 4 readings').waitFor()
  expect(await readings(number)).toHaveLength(4)
  await again.context().close()
})

/** What the server has of the sample's runs: each value, and how often. */
function readings(number: string): Promise<{ value: number; times: number }[]> {
  return product.query(
    `select (g.value->>'value')::float as value, count(*)::int as times from readings g join test_runs r on r.id = g.test_run_id join tests t on t.id = r.test_id join samples s on s.id = t.sample_id
     where s.number = $1 and g.path like 'readings.%' group by 1 order by 1`,
    [number],
  )
}
