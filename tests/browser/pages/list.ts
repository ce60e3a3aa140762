import type { Locator, Page } from 'playwright-core'
import type { Product } from '../../support/product.ts'

/** Who looks at a page; the three who work have accounts in the demonstration. */
export const accounts = { client: 'buyer@brackwater.example', technician: 'bench@tarnwick.example', manager: 'manager@tarnwick.example' }
export type Who = keyof typeof accounts | 'anyone'

export type OpenPage = {
  /** As in src/routes.tsx. */
  route: string
  who: Who
  address: string
  /** What says that everything is there. */
  ready: (page: Page) => Locator
  /** The deed that the page is there for; it must be reached by Tab. */
  deed?: (page: Page) => Locator
  /** What the console says there on purpose. */
  says?: RegExp
}

const heading = (name: string | RegExp) => (page: Page) => page.getByRole('heading', { level: 1, name })
const button = (name: string | RegExp) => (page: Page) => page.getByRole('button', { name }).locator('visible=true').first()
const link = (name: string | RegExp) => (page: Page) => page.getByRole('main').getByRole('link', { name }).locator('visible=true').first()

/** Every page with an address that shows it full of the demonstration's work. */
export async function everyPage({ query }: Product): Promise<OpenPage[]> {
  const one = async (sql: string) => {
    const [row] = await query<{ id: string }>(sql)
    if (!row) throw new Error(`the demonstration has nothing for: ${sql}`)
    return row.id
  }
  const ofBrackwater = `customer_id = (select id from customers where name = 'Brackwater Forge')`
  const job = await one(`select job_id as id from holds where job_id in (select id from jobs where ${ofBrackwater}) limit 1`)
  const draft = await one(`select id from jobs where ${ofBrackwater} and state = 'draft' limit 1`)
  const sample = await one(`select sample_id as id from holds where job_id = '${job}' limit 1`)
  const invoice = await one(`select id from invoices where ${ofBrackwater} limit 1`)
  const bench = (code: string) => one(`select id from benches where code = '${code}'`)
  const openRun = await one(`select r.id from test_runs r join benches b on b.id = r.bench_id where r.state = 'recorded' and b.code = 'T-F1' limit 1`)
  return [
    { route: '/sign-in', who: 'anyone', address: '/sign-in', ready: heading('Sign in'), deed: button('Sign in') },
    { route: '/forgotten', who: 'anyone', address: '/forgotten', ready: heading('Forgotten password'), deed: button(/link|mail/i) },
    { route: '/links/:token', who: 'anyone', address: `/links/${'x'.repeat(43)}`, ready: heading('This link does not work'), deed: link(/./), says: /status of 404/ },
    { route: '/check', who: 'anyone', address: '/check?number=R-26-99999/1&code=AAAA-BBBB-CCCC', ready: (page) => page.getByRole('region', { name: 'Answer' }), deed: button('Check') },
    { route: '/jobs', who: 'client', address: '/jobs', ready: heading('Jobs of Brackwater Forge'), deed: button('New job') },
    { route: '/jobs/:jobId', who: 'client', address: `/jobs/${job}`, ready: heading(/^Job J-/), deed: button(/Send|Answer|Take/) },
    { route: '/jobs/:jobId/order', who: 'client', address: `/jobs/${draft}/order`, ready: (page) => page.getByText('earliest finish').first(), deed: button(/^Place job/) },
    { route: '/jobs/:jobId/labels', who: 'client', address: `/jobs/${job}/labels`, ready: heading(/^Labels of/), deed: button('Print') },
    { route: '/jobs/:jobId/packing-slip', who: 'client', address: `/jobs/${job}/packing-slip`, ready: heading(/^Packing slip of/), deed: button('Print') },
    { route: '/samples', who: 'client', address: '/samples', ready: (page) => page.getByRole('link', { name: /^J-26-/ }).locator('visible=true').first(), deed: link(/^J-26-/) },
    { route: '/samples/:sampleId', who: 'client', address: `/samples/${sample}`, ready: heading(/^Sample J-/), deed: link(/^J-26-/) },
    { route: '/reports', who: 'client', address: '/reports', ready: heading(/^Reports/) },
    { route: '/invoices', who: 'client', address: '/invoices', ready: heading(/^Invoices/), deed: link(/^I/) },
    { route: '/invoices/:invoiceId', who: 'client', address: `/invoices/${invoice}`, ready: heading(/^Invoice/), deed: button('Print') },
    { route: '/me', who: 'client', address: '/me', ready: heading('Bryn Aldous'), deed: button('Change my password') },
    { route: '/bench', who: 'technician', address: '/bench', ready: (page) => page.getByRole('link', { name: /^Hardness 1/ }), deed: link(/^Hardness 1/) },
    { route: '/bench/:benchId', who: 'technician', address: `/bench/${await bench('T-H1')}`, ready: (page) => page.getByRole('button', { name: /^(Begin run|Start|Record run)/ }), deed: button(/^(Begin run|Start|Record run)/) },
    { route: '/bench/:benchId', who: 'technician', address: `/bench/${await bench('T-CU1')}`, ready: (page) => page.getByRole('button', { name: /^(Start|Done)/ }), deed: button(/^(Start|Done)/) },
    { route: '/receive', who: 'technician', address: '/receive', ready: (page) => page.getByRole('link', { name: /^J-26-/ }).first(), deed: link(/^J-26-/) },
    { route: '/jobs/:jobId', who: 'technician', address: `/jobs/${job}`, ready: heading(/^Job J-/), deed: link(/^Sample/) },
    { route: '/samples/:sampleId', who: 'technician', address: `/samples/${sample}`, ready: heading(/^Sample J-/), deed: link(/^J-26-/) },
    { route: '/equipment', who: 'technician', address: '/equipment', ready: heading('Equipment') },
    { route: '/review', who: 'manager', address: `/review?run=${openRun}`, ready: (page) => page.getByRole('button', { name: /^Accept run/ }), deed: button(/^Accept run/) },
    { route: '/floor', who: 'manager', address: '/floor', ready: heading(/^Floor/) },
    { route: '/people', who: 'manager', address: '/people', ready: heading('People'), deed: link(/Invite/) },
    { route: '/jobs', who: 'manager', address: '/jobs', ready: heading('Jobs'), deed: link(/^J-26-/) },
    { route: '*', who: 'manager', address: '/nowhere', ready: heading('There is no such page'), deed: link('the first page') },
  ]
}
